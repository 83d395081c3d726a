using System.CommandLine;

namespace Assize.Cli;

sealed class PlanQuantilePage : ICommandPage
{
    const string Example = "assize plan quantile --probability 0.99 --tolerance 0.002";

    readonly Option<double?> probability = Numbers.Option("--probability", "The share of draws up to the quantile, in (0, 1).");
    readonly Option<double?> tolerance = Numbers.Option("--tolerance", "How far that share may be from it: a distance, 0 allowed.");
    readonly Option<double?> defect = Numbers.Option("--defect", "How far must be caught: a distance. Default: twice the tolerance.");
    readonly Option<double?> risk = Numbers.Option("--risk", "Probability of a false failure allowed in one run. Default: 1e-9.");
    readonly Option<double?> confidence = Numbers.Option("--confidence", "1 minus the probability of a missed defect allowed. Default: 0.999.");
    readonly Option<bool> json = new("--json") { Description = "Answer in JSON." };

    public string Words => "plan quantile";

    public Command Define(Desk desk)
    {
        var command = new Command("quantile", $"""
            The trials it takes to judge a quantile, for draws of any distribution.
            Example: {Example}
            """)
        {
            probability, tolerance, defect, risk, confidence, json,
        };
        command.SetAction(line =>
        {
            // The trials do not depend on the value that is the quantile.
            var claim = Claim.Quantile(Required(line, probability), 0, Required(line, tolerance), line.GetValue(defect));
            if (line.GetValue(risk) is { } allowed)
                claim = claim.WithRisk(allowed);
            if (line.GetValue(confidence) is { } wanted)
                claim = claim.WithConfidence(wanted);
            if (line.GetValue(json))
                desk.Output.WriteLine(PlanJson.Write(claim.Plan()));
            else
                PlanText.Write(desk.Page(), claim);
            return (int)ExitCode.Kept;
        });
        return command;
    }

    static double Required(ParseResult line, Option<double?> option) => line.GetValue(option)
        ?? throw new CouldNotRunException($"{option.Name} is missing. Example: {Example}");
}
