using System.Diagnostics;

namespace Assize;

/// <summary>NUnit. A refuted claim goes through its own Fail, which records the failure and gathers several inside a multiple assertion.</summary>
sealed class NUnitHost : Host
{
    const string Assembly = "nunit.framework";

    public override HostContext? Context(Site site)
    {
        object? context = Loaded(Assembly, "NUnit.Framework.Internal.TestExecutionContext")?.GetProperty("CurrentContext")?.GetValue(null);
        object? test = Follow(context, "CurrentTest");
        // Outside a test the framework hands out an ad hoc context of its own.
        if (test is null || Loaded(Assembly, "NUnit.Framework.Internal.TestMethod")?.IsInstanceOfType(test) != true)
            return null;

        string type = Follow(test, "ClassName") as string ?? "";
        string member = Follow(test, "MethodName") as string ?? site.Member;
        var output = Follow(context, "OutWriter") as TextWriter;
        return new HostContext
        {
            Assembly = (Follow(test, "TypeInfo", "Type") as Type)?.Assembly.GetName().Name ?? "",
            Test = Follow(test, "FullName") as string ?? $"{type}.{member}",
            Method = $"{type}.{member}",
            Write = output is null ? _ => { } : output.WriteLine,
            Fail = Fail,
        };
    }

    // Through a delegate: an invocation by reflection would wrap the failure and have it reported twice.
    [StackTraceHidden]
    static void Fail(Verdict verdict) => Loaded(Assembly, "NUnit.Framework.Assert")!
        .GetMethod("Fail", [typeof(string)])!.CreateDelegate<Action<string>>()(verdict.ToString());
}
