using System.Text.Json;
using System.Text.Json.Nodes;
using Assize.Bounds;

namespace Assize.Cli;

/// <summary>A plan as other programs read it.</summary>
static class PlanJson
{
    static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    public static string Write(Plan plan) => new JsonObject
    {
        ["fixed"] = Fixed(plan),
        ["sequential"] = Sequential(plan),
        ["theorems"] = new JsonArray([.. plan.Alternatives.Select(theorem => new JsonObject
        {
            ["name"] = theorem.Name,
            ["trials"] = theorem.Trials,
            ["assumes"] = theorem.Assumes,
        })]),
    }.ToJsonString(Indented);

    // What a family does not have is left out, not null.
    static JsonObject Fixed(Plan plan)
    {
        var json = new JsonObject { ["trials"] = plan.FixedTrials, ["firstTrials"] = plan.FirstTrials };
        if (plan.Limits is { } limits)
            (json["acceptLow"], json["acceptHigh"]) = (limits.AcceptLow, limits.AcceptHigh);
        json["theorem"] = plan.Theorem;
        if (plan.Limits is { } errors)
            (json["falseFailure"], json["missedDefect"]) = (Ends(errors.FalseFailure), Ends(errors.MissedDefect));
        return json;
    }

    static JsonObject Sequential(Plan plan)
    {
        var json = new JsonObject { ["cap"] = plan.TrialCap };
        if (plan.Expected is { } expected)
        {
            json["expectedTrials"] = new JsonObject
            {
                ["atTarget"] = expected.AtTarget,
                ["atTolerance"] = expected.AtTolerance,
                ["atDefect"] = expected.AtDefect,
            };
        }

        return json;
    }

    static JsonObject Ends(Enclosure enclosure) => new() { ["lower"] = enclosure.Lower, ["upper"] = enclosure.Upper };
}
