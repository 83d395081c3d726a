using System.Text.Json;
using System.Text.Json.Nodes;
using Assize.Bounds;

namespace Assize.Cli;

/// <summary>An inspection as other programs read it.</summary>
static class InspectedJson
{
    static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    public static string Write(Inspected inspected) => new JsonObject
    {
        ["exit"] = (int)inspected.Exit,
        ["readFrom"] = inspected.ReadFrom,
        ["notes"] = Texts(inspected.Notes),
        ["assertions"] = new JsonArray([.. inspected.Assertions.Select(assertion => Of(assertion, inspected))]),
        ["claims"] = new JsonArray([.. inspected.Claims.Select(claim => Of(claim, inspected))]),
        ["totals"] = new JsonObject
        {
            ["assertions"] = inspected.Assertions.Count,
            ["assessed"] = inspected.Assessed,
            ["flaky"] = inspected.Flaky,
            ["toothless"] = inspected.Toothless,
            ["falseFailureUpper"] = inspected.FalseFailureUpper,
            ["unbounded"] = inspected.Unbounded,
            ["pinned"] = inspected.Pinned,
            ["claims"] = inspected.Claims.Count,
            ["budget"] = inspected.Budget,
            ["withinBudget"] = inspected.WithinBudget,
        },
    }.ToJsonString(Indented);

    static JsonObject Of(InspectedAssertion assertion, Inspected inspected) => new()
    {
        ["file"] = inspected.Relative(assertion.Place),
        ["line"] = assertion.Place.Line,
        ["method"] = assertion.Place.Method,
        ["framework"] = assertion.Framework,
        ["shape"] = assertion.Shape,
        ["statistic"] = assertion.Statistic,
        ["trials"] = assertion.Trials,
        ["acceptedLow"] = assertion.AcceptedLow,
        ["acceptedHigh"] = assertion.AcceptedHigh,
        ["target"] = assertion.Target,
        ["seed"] = assertion.Seed,
        ["falseFailure"] = Of(assertion.FalseFailure),
        ["smallestDefectCaught"] = assertion.SmallestDefectCaught,
        ["trialsNeeded"] = assertion.TrialsNeeded,
        ["theorem"] = assertion.Theorem,
        ["rules"] = Texts(assertion.Findings.Select(finding => finding.Rule)),
    };

    static JsonObject Of(InspectedClaim claim, Inspected inspected) => new()
    {
        ["file"] = inspected.Relative(claim.Place),
        ["line"] = claim.Place.Line,
        ["method"] = claim.Place.Method,
        ["text"] = claim.Text,
        ["trials"] = claim.Trials,
        ["trialsNeeded"] = claim.TrialsNeeded,
        ["rules"] = Texts(claim.Findings.Select(finding => finding.Rule)),
    };

    static JsonObject? Of(Enclosure? enclosure) => enclosure is { } ends
        ? new JsonObject { ["lower"] = ends.Lower, ["upper"] = ends.Upper }
        : null;

    static JsonArray Texts(IEnumerable<string> texts) => new([.. texts.Select(text => JsonValue.Create(text))]);
}
