using System.CommandLine;

namespace Assize.Cli;

sealed class PlanRatePage : ICommandPage
{
    readonly Option<double?> target = Numbers.Option("--target", "The rate claimed, in [0, 1].");
    readonly Option<double?> tolerance = Numbers.Option("--tolerance", "How far from the target is still right: a distance, 0 allowed.");
    readonly Option<double?> defect = Numbers.Option("--defect", "How far from the target must be caught: a distance. Default: twice the tolerance.");
    readonly Option<double?> atLeast = Numbers.Side("--at-least", "Claim this rate or more (or, without a number, --target or more).");
    readonly Option<double?> atMost = Numbers.Side("--at-most", "Claim this rate or less (or, without a number, --target or less).");
    readonly Option<double?> risk = Numbers.Option("--risk", "Probability of a false failure allowed in one run. Default: 1e-9.");
    readonly Option<double?> confidence = Numbers.Option("--confidence", "1 minus the probability of a missed defect allowed. Default: 0.999.");
    readonly Option<bool> json = new("--json") { Description = "Answer in JSON." };

    public string Words => "plan rate";

    public Command Define(Desk desk)
    {
        var command = new Command("rate", """
            The trials it takes to judge a rate: with a number of trials fixed beforehand, and sequentially.
            Example: assize plan rate --target 0.75 --tolerance 0.01
            """)
        {
            target, tolerance, defect, atLeast, atMost, risk, confidence, json,
        };
        command.SetAction(line =>
        {
            var claim = Claimed(line);
            if (line.GetValue(json))
                desk.Output.WriteLine(PlanJson.Write(claim.Plan()));
            else
                PlanText.Write(desk.Page(), claim);
            return (int)ExitCode.Kept;
        });
        return command;
    }

    RateClaim Claimed(ParseResult line)
    {
        var claim = Side(line);
        if (line.GetValue(risk) is { } allowed)
            claim = claim.WithRisk(allowed);
        return line.GetValue(confidence) is { } wanted ? claim.WithConfidence(wanted) : claim;
    }

    RateClaim Side(ParseResult line)
    {
        bool least = line.GetResult(atLeast) is not null, most = line.GetResult(atMost) is not null;
        if (least && most)
            throw new CouldNotRunException("--at-least and --at-most exclude each other; for both sides give --target and --tolerance.");
        if (least || most)
            return OneSided(line, least);

        return Claim.Rate(Required(line, target), line.GetValue(tolerance) ?? throw Missing(tolerance), line.GetValue(defect));
    }

    RateClaim OneSided(ParseResult line, bool least)
    {
        if (line.GetValue(tolerance) is { } given && given != 0)
            throw new CouldNotRunException($"A one-sided claim has no tolerance (it is {Numbers.Text(given)}): shift the rate itself instead.");

        var side = least ? atLeast : atMost;
        double rate = line.GetValue(side) ?? Required(line, target);
        double distance = Required(line, defect);
        // Below 0 and above 1 there is nothing to catch: the worst that can be is the rim itself.
        return least
            ? Claim.RateAtLeast(rate, distance > rate ? rate : distance)
            : Claim.RateAtMost(rate, distance > 1 - rate ? 1 - rate : distance);
    }

    static double Required(ParseResult line, Option<double?> option) => line.GetValue(option) ?? throw Missing(option);

    static CouldNotRunException Missing(Option option) =>
        new($"{option.Name} is missing. Example: assize plan rate --target 0.75 --tolerance 0.01 --defect 0.02");
}
