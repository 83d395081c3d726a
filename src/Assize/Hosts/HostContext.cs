using System.Diagnostics;

namespace Assize;

/// <summary>The test around a claim, as its framework knows it; captured once, on the thread that judges.</summary>
sealed record HostContext
{
    /// <summary>The simple name of the test assembly.</summary>
    public required string Assembly { get; init; }

    /// <summary>The test with its data row.</summary>
    public required string Test { get; init; }

    /// <summary>The test method with namespace and class, without data row.</summary>
    public required string Method { get; init; }

    /// <summary>Writes a line to the test's own output.</summary>
    public Action<string> Write { get; init; } = _ => { };

    /// <summary>Fails the test in the framework's own way. It may return, where the framework gathers several failures.</summary>
    public Action<Verdict> Fail { get; init; } = Throw;

    /// <summary>The command that runs this test again with the same draws.</summary>
    public string RunAgain(ulong seed) => OperatingSystem.IsWindows()
        ? $"$env:{RunSeed.Variable}='{RunSeed.Text(seed)}'; dotnet test --filter \"FullyQualifiedName~{Method}\""
        : $"{RunSeed.Variable}={RunSeed.Text(seed)} dotnet test --filter \"FullyQualifiedName~{Method}\"";

    public static HostContext Current(Claim claim, Site site)
    {
        var context = Host.All.Select(host => host.Context(site)).FirstOrDefault(found => found is not null) ?? WithoutFramework(site);
        return claim.Terms.Output is { } output ? context with { Write = output } : context;
    }

    [StackTraceHidden]
    static void Throw(Verdict verdict) => throw new ClaimRefutedException(verdict);

    static HostContext WithoutFramework(Site site) => new()
    {
        Assembly = System.Reflection.Assembly.GetEntryAssembly()?.GetName().Name ?? "",
        Test = $"{Path.GetFileNameWithoutExtension(site.File)}.{site.Member}",
        Method = site.Member,
    };
}
