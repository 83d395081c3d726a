using System.Text.RegularExpressions;

namespace Assize.Cli;

/// <summary>Builds test projects so that the analyzer reads them, whether or not they reference it.</summary>
static partial class SuiteBuild
{
    /// <summary>Builds one project and leaves the findings in <paramref name="findings"/>.</summary>
    public static async Task BuildAsync(string project, string configuration, string findings, CancellationToken token)
    {
        var lines = new List<string>();
        string home = AppContext.BaseDirectory;
        // Two projects of one name would write to one file.
        findings = Directory.CreateDirectory(Path.Combine(findings, Guid.NewGuid().ToString("n"))).FullName;
        int exit = await ChildProcess.RunAsync(ChildProcess.Dotnet(
            Path.GetDirectoryName(project)!,
            "build", project, "-nologo", "-v:quiet", $"-p:Configuration={configuration}",
            $"-p:CustomAfterMicrosoftCommonTargets={Path.Combine(home, "Build", "assize.targets")}",
            $"-p:AssizeProject={project}",
            $"-p:AssizeFindings={findings}",
            $"-p:AssizeAnalyzers={Path.Combine(home, "analyzers")}",
            $"-p:AssizeRules={string.Join("%3B", Rules())}"), lines.Add, token);
        if (exit != 0)
            throw new CouldNotRunException($"{project} does not build:\n{string.Join('\n', lines.Distinct())}");
    }

    /// <summary>The ids of every released and unreleased rule, as the analyzer's own release notes list them.</summary>
    public static IReadOnlyList<string> Rules() =>
    [
        .. typeof(SuiteBuild).Assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith("AnalyzerReleases", StringComparison.Ordinal))
            .SelectMany(name => Id().Matches(Text(name)).Select(match => match.Value))
            .Distinct().Order(StringComparer.Ordinal),
    ];

    static string Text(string resource)
    {
        using var reader = new StreamReader(typeof(SuiteBuild).Assembly.GetManifestResourceStream(resource)!);
        return reader.ReadToEnd();
    }

    [GeneratedRegex(@"\bASZ\d{4}\b")]
    private static partial Regex Id();
}
