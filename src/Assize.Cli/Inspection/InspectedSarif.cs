using System.Text.Json;
using System.Text.Json.Nodes;
using Assize.Analyzers;
using Microsoft.CodeAnalysis;

namespace Assize.Cli;

/// <summary>The findings of an inspection in SARIF 2.1.0 (OASIS Standard, 27 March 2020).</summary>
static class InspectedSarif
{
    const string Base = "ROOT";

    static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    public static string Write(Inspected inspected)
    {
        var rules = RandomizedTests.Rules.Select(rule => rule.Descriptor).ToList();
        return new JsonObject
        {
            ["$schema"] = "https://docs.oasis-open.org/sarif/sarif/v2.1.0/errata01/os/schemas/sarif-schema-2.1.0.json",
            ["version"] = "2.1.0",
            ["runs"] = new JsonArray(new JsonObject
            {
                ["tool"] = new JsonObject { ["driver"] = Driver(rules) },
                ["columnKind"] = "utf16CodeUnits",
                ["originalUriBaseIds"] = new JsonObject { [Base] = new JsonObject { ["uri"] = FolderUri(inspected.Root) } },
                ["results"] = new JsonArray(
                    [.. inspected.Findings.Select(found => Result(found.Place, found.Finding, rules, inspected))]),
            }),
        }.ToJsonString(Indented);
    }

    static JsonObject Driver(List<DiagnosticDescriptor> rules) => new()
    {
        ["name"] = "assize",
        ["version"] = typeof(InspectedSarif).Assembly.GetName().Version!.ToString(3),
        ["rules"] = new JsonArray([.. rules.Select(rule => new JsonObject
        {
            ["id"] = rule.Id,
            ["shortDescription"] = new JsonObject { ["text"] = rule.Title.ToString(System.Globalization.CultureInfo.InvariantCulture) },
            ["defaultConfiguration"] = new JsonObject { ["level"] = Level(rule.DefaultSeverity) },
        })]),
    };

    static JsonObject Result(Place place, InspectedFinding finding, List<DiagnosticDescriptor> rules, Inspected inspected) => new()
    {
        ["ruleId"] = finding.Rule,
        ["ruleIndex"] = rules.FindIndex(rule => rule.Id == finding.Rule),
        ["level"] = finding.Level,
        ["message"] = new JsonObject { ["text"] = Inert.Sarif(finding.Message) },
        ["locations"] = new JsonArray(new JsonObject
        {
            ["physicalLocation"] = new JsonObject
            {
                ["artifactLocation"] = new JsonObject { ["uri"] = Uri(inspected.Relative(place)), ["uriBaseId"] = Base },
                ["region"] = new JsonObject
                {
                    ["startLine"] = place.Line,
                    ["startColumn"] = place.Column,
                    ["endLine"] = place.EndLine,
                    ["endColumn"] = place.EndColumn,
                },
            },
            ["logicalLocations"] = new JsonArray(new JsonObject { ["fullyQualifiedName"] = place.Method, ["kind"] = "function" }),
        }),
    };

    static string Level(DiagnosticSeverity severity) => severity switch
    {
        DiagnosticSeverity.Error => "error",
        DiagnosticSeverity.Warning => "warning",
        _ => "note",
    };

    static string FolderUri(string folder) => new UriBuilder
    {
        Scheme = System.Uri.UriSchemeFile,
        Host = "",
        Path = Uri(folder.Replace('\\', '/')).TrimEnd('/') + "/",
    }.Uri.AbsoluteUri;

    static string Uri(string path) => string.Join('/', path.Split('/').Select(System.Uri.EscapeDataString));
}
