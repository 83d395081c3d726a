namespace Assize;

/// <summary>xunit v3. A refuted claim fails the test because the exception's type bears an interface of the right name.</summary>
sealed class XunitHost : Host
{
    public override HostContext? Context(Site site)
    {
        object? context = Loaded("xunit.v3.core", "Xunit.TestContext")?.GetProperty("Current")?.GetValue(null);
        // The interfaces are implemented explicitly in places, so every step goes through what the framework declares public.
        object? test = Follow(context, "Test");
        if (test is null)
            return null;

        object? method = Follow(context, "TestMethod");
        string type = Follow(method, "TestClass", "TestClassName") as string ?? "";
        string member = Follow(method, "MethodName") as string ?? site.Member;
        object? output = Follow(context, "TestOutputHelper");
        var write = output?.GetType().GetMethod("WriteLine", [typeof(string)])?.CreateDelegate<Action<string>>(output);
        return new HostContext
        {
            Assembly = Follow(context, "TestAssembly", "AssemblyName") is string name ? name.Split(',')[0] : "",
            Test = Follow(test, "TestDisplayName") as string ?? $"{type}.{member}",
            Method = $"{type}.{member}",
            Write = write ?? (_ => { }),
        };
    }
}
