using System.Diagnostics;
using System.Reflection;

namespace Assize;

/// <summary>MSTest from 4.5 on, where a test's context is at hand. A refuted claim goes through its own Fail.</summary>
sealed class MSTestHost : Host
{
    static readonly string[] Assemblies = ["MSTest.TestFramework", "MSTest.TestFramework.Extensions"];

    public override HostContext? Context(Site site)
    {
        object? context = Type("TestContext")?.GetProperty("Current", BindingFlags.Public | BindingFlags.Static)?.GetValue(null);
        if (context is null)
            return null;

        string type = Follow(context, "FullyQualifiedTestClassName") as string ?? "";
        string member = Follow(context, "TestName") as string ?? site.Member;
        string shown = Follow(context, "TestDisplayName") as string ?? member;
        var write = context.GetType().GetMethod("WriteLine", [typeof(string)])?.CreateDelegate<Action<string>>(context);
        return new HostContext
        {
            Assembly = Class(type)?.Assembly.GetName().Name ?? "",
            Test = $"{type}.{shown}",
            Method = $"{type}.{member}",
            Write = write ?? (_ => { }),
            Fail = Fail,
        };
    }

    static Type? Type(string name) =>
        Assemblies.Select(assembly => Loaded(assembly, $"Microsoft.VisualStudio.TestTools.UnitTesting.{name}")).FirstOrDefault(found => found is not null);

    static Type? Class(string name) => AppDomain.CurrentDomain.GetAssemblies()
        .Select(assembly => assembly.GetType(name)).FirstOrDefault(found => found is not null);

    [StackTraceHidden]
    static void Fail(Verdict verdict) =>
        Type("Assert")!.GetMethod("Fail", [typeof(string)])!.CreateDelegate<Action<string>>()(verdict.ToString());
}
