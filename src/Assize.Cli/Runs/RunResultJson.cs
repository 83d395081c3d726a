using System.Text.Json;
using System.Text.Json.Nodes;

namespace Assize.Cli;

/// <summary>A run as other programs read it.</summary>
static class RunResultJson
{
    static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    public static string Write(RunResult result) => new JsonObject
    {
        ["exit"] = (int)result.Exit,
        ["redProjects"] = new JsonArray([.. result.RedProjects.Select(project => JsonValue.Create(project))]),
        ["claims"] = new JsonObject
        {
            ["judged"] = result.Tally.Entries.Count,
            ["upheld"] = result.Tally.Count(Outcome.Upheld),
            ["refuted"] = result.Tally.Count(Outcome.Refuted),
            ["undecided"] = result.Tally.Count(Outcome.Undecided),
            ["trials"] = result.Tally.Trials,
            ["tornLines"] = result.TornLines,
        },
        ["budget"] = new JsonObject
        {
            ["allowed"] = result.Tally.Budget,
            ["falseFailureUpper"] = result.Tally.FalseFailure,
            ["kept"] = result.Tally.WithinBudget,
        },
        ["findings"] = new JsonArray([.. result.Findings.Select(finding => new JsonObject
        {
            ["rule"] = finding.Rule,
            ["level"] = finding.Level,
            ["message"] = finding.Message,
            ["file"] = finding.File,
            ["line"] = finding.Line,
        })]),
    }.ToJsonString(Indented);
}
