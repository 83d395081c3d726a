using System.Text.Json;
using System.Text.Json.Nodes;

namespace Assize.Cli;

/// <summary>A tally as other programs read it.</summary>
static class TallyJson
{
    static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    public static string Write(TallyResult result) => new JsonObject
    {
        ["exit"] = (int)result.Exit,
        ["claims"] = new JsonObject
        {
            ["judged"] = result.Tally.Entries.Count,
            ["upheld"] = result.Tally.Count(Outcome.Upheld),
            ["refuted"] = result.Tally.Count(Outcome.Refuted),
            ["undecided"] = result.Tally.Count(Outcome.Undecided),
            ["trials"] = result.Tally.Trials,
            ["files"] = result.Files,
            ["tornLines"] = result.TornLines,
        },
        ["budget"] = new JsonObject
        {
            ["allowed"] = result.Tally.Budget,
            ["falseFailureUpper"] = result.Tally.FalseFailure,
            ["falseFailureIfIndependent"] = result.Tally.IfIndependent,
            ["kept"] = result.Tally.WithinBudget,
        },
        ["tests"] = new JsonArray([.. result.Spent.Select(spending => new JsonObject
        {
            ["assembly"] = spending.Assembly,
            ["test"] = spending.Test,
            ["claims"] = spending.Claims,
            ["risk"] = spending.Risk,
            ["trials"] = spending.Trials,
        })]),
    }.ToJsonString(Indented);
}
