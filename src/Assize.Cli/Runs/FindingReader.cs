using System.Text.Json;

namespace Assize.Cli;

/// <summary>Reads the analyzer's findings out of the SARIF files a build wrote (OASIS SARIF 2.1.0).</summary>
static class FindingReader
{
    public static IReadOnlyList<Finding> Read(string folder) =>
    [
        .. Directory.EnumerateFiles(folder, "*.sarif", SearchOption.AllDirectories)
            .SelectMany(ReadFile)
            .Where(finding => finding.Rule.StartsWith("ASZ", StringComparison.Ordinal))
            // A project built for two frameworks says everything twice.
            .Distinct()
            .OrderBy(finding => finding.File, StringComparer.Ordinal).ThenBy(finding => finding.Line).ThenBy(finding => finding.Rule),
    ];

    static List<Finding> ReadFile(string path)
    {
        using var log = JsonDocument.Parse(File.ReadAllText(path));
        return
        [
            .. from run in log.RootElement.GetProperty("runs").EnumerateArray()
               from result in run.GetProperty("results").EnumerateArray()
               where !IsSuppressed(result)
               select From(result),
        ];
    }

    static bool IsSuppressed(JsonElement result) =>
        result.TryGetProperty("suppressions", out var suppressions) && suppressions.GetArrayLength() > 0;

    static Finding From(JsonElement result)
    {
        string level = result.TryGetProperty("level", out var stated) ? stated.GetString()! : "warning";
        string message = result.GetProperty("message").GetProperty("text").GetString()!;
        string rule = result.GetProperty("ruleId").GetString()!;
        if (!result.TryGetProperty("locations", out var locations) || locations.GetArrayLength() == 0)
            return new Finding(rule, level, message, "", 0);

        var place = locations[0].GetProperty("physicalLocation");
        var uri = new Uri(place.GetProperty("artifactLocation").GetProperty("uri").GetString()!, UriKind.RelativeOrAbsolute);
        return new Finding(rule, level, message,
            uri.IsAbsoluteUri ? uri.LocalPath : uri.OriginalString,
            place.GetProperty("region").GetProperty("startLine").GetInt32());
    }
}
