using System.Text.Json;
using System.Text.Json.Nodes;
using Assize.Bounds;

namespace Assize.Cli;

/// <summary>A plan as other programs read it.</summary>
static class RatePlanJson
{
    static readonly JsonSerializerOptions Indented = new() { WriteIndented = true };

    public static string Write(Plan plan) => new JsonObject
    {
        ["fixed"] = new JsonObject
        {
            ["trials"] = plan.FixedTrials,
            ["firstTrials"] = plan.FirstTrials,
            ["acceptLow"] = plan.Limits!.AcceptLow,
            ["acceptHigh"] = plan.Limits!.AcceptHigh,
            ["theorem"] = plan.Theorem,
            ["falseFailure"] = Ends(plan.Limits!.FalseFailure),
            ["missedDefect"] = Ends(plan.Limits!.MissedDefect),
        },
        ["sequential"] = new JsonObject
        {
            ["cap"] = plan.TrialCap,
            ["expectedTrials"] = new JsonObject
            {
                ["atTarget"] = plan.Expected!.AtTarget,
                ["atTolerance"] = plan.Expected!.AtTolerance,
                ["atDefect"] = plan.Expected!.AtDefect,
            },
        },
        ["theorems"] = new JsonArray([.. plan.Alternatives.Select(theorem => new JsonObject
        {
            ["name"] = theorem.Name,
            ["trials"] = theorem.Trials,
            ["assumes"] = theorem.Assumes,
        })]),
    }.ToJsonString(Indented);

    static JsonObject Ends(Enclosure enclosure) => new() { ["lower"] = enclosure.Lower, ["upper"] = enclosure.Upper };
}
