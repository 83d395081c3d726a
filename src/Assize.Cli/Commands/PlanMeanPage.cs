using System.CommandLine;

namespace Assize.Cli;

sealed class PlanMeanPage : ICommandPage
{
    const string Example = "assize plan mean --target 3.5 --tolerance 0.05 --from 1 --to 6";

    readonly Option<double?> target = Numbers.Option("--target", "The mean claimed.");
    readonly Option<double?> tolerance = Numbers.Option("--tolerance", "How far from the target is still right: a distance, 0 allowed.");
    readonly Option<double?> defect = Numbers.Option("--defect", "How far from the target must be caught: a distance. Default: twice the tolerance.");
    readonly Option<double?> from = Numbers.Option("--from", "The least draw there can be, with --to.");
    readonly Option<double?> to = Numbers.Option("--to", "The greatest draw there can be, with --from.");
    readonly Option<double?> deviation = Numbers.Option("--deviation", "At least the standard deviation of a draw, whatever goes wrong.");
    readonly Option<double?> proxy = Numbers.Option("--sub-gaussian", "The standard deviation of a normal distribution whose tails are no lighter.");
    readonly Option<double?> square = Numbers.Option("--mean-square", "At least the mean of the square of a draw that is never negative.");
    readonly Option<double?> risk = Numbers.Option("--risk", "Probability of a false failure allowed in one run. Default: 1e-9.");
    readonly Option<double?> confidence = Numbers.Option("--confidence", "1 minus the probability of a missed defect allowed. Default: 0.999.");
    readonly Option<bool> json = new("--json") { Description = "Answer in JSON." };

    public string Words => "plan mean";

    public Command Define(Desk desk)
    {
        var command = new Command("mean", $"""
            The trials it takes to judge a mean, by what is known about a draw: theorem by theorem.
            Example: {Example}
            """)
        {
            target, tolerance, defect, from, to, deviation, proxy, square, risk, confidence, json,
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

    MeanClaim Claimed(ParseResult line)
    {
        var numbers = Claim.Mean(Required(line, target), Required(line, tolerance), line.GetValue(defect));
        MeanClaim? claim = null;
        if (line.GetValue(from) is not null || line.GetValue(to) is not null)
            claim = numbers.DrawsBetween(Required(line, from), Required(line, to));
        if (line.GetValue(deviation) is { } spread)
            claim = claim?.DrawsDeviateAtMost(spread) ?? numbers.DrawsDeviateAtMost(spread);
        if (line.GetValue(proxy) is { } tails)
            claim = claim?.DrawsSubGaussian(tails) ?? numbers.DrawsSubGaussian(tails);
        if (line.GetValue(square) is { } moment)
            claim = claim?.DrawsNonNegative(moment) ?? numbers.DrawsNonNegative(moment);
        if (claim is null)
            throw new CouldNotRunException("Nothing is said about a draw, so no number of trials says anything about its mean. "
                + $"Give --from and --to, --deviation, --sub-gaussian or --mean-square. Example: {Example}");
        if (line.GetValue(risk) is { } allowed)
            claim = claim.WithRisk(allowed);
        return line.GetValue(confidence) is { } wanted ? claim.WithConfidence(wanted) : claim;
    }

    static double Required(ParseResult line, Option<double?> option) => line.GetValue(option)
        ?? throw new CouldNotRunException($"{option.Name} is missing. Example: {Example}");
}
