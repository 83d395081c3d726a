using Spectre.Console;

namespace Assize.Cli;

/// <summary>A plan as people read it.</summary>
static class PlanText
{
    public static void Write(IAnsiConsole page, Claim claim)
    {
        var plan = claim.Plan();
        page.MarkupLineInterpolated($"[bold]Claim: {claim}[/]");
        page.MarkupLineInterpolated($"Risk of a false failure {Numbers.Text(claim.Risk)}, confidence {Numbers.Text(claim.Confidence)}.");
        page.WriteLine();
        page.Write(Ways(plan));
        page.WriteLine();
        page.Write(Theorems(plan));
    }

    static Grid Ways(Plan plan)
    {
        var grid = new Grid().AddColumn(new GridColumn().NoWrap().PadRight(3)).AddColumn();
        string[] sequential = plan.Expected is { } expected
            ?
            [
                $"about {Trials(expected.AtTarget)} trials when the rate is at its target,",
                $"{Trials(expected.AtTolerance)} at the edge of the tolerance, {Trials(expected.AtDefect)} at the defect,",
                $"never more than {Numbers.Text(plan.TrialCap)}",
            ]
            : [$"as few trials as the draws allow, never more than {Numbers.Text(plan.TrialCap)}"];
        for (int i = 0; i < sequential.Length; i++)
            grid.AddRow(i == 0 ? "Sequential" : "", sequential[i]);
        grid.AddRow("", "");
        grid.AddRow("Fixed", $"{Numbers.Text(plan.FixedTrials)} trials: {Region(plan)}");
        if (plan.Limits is { } limits)
            grid.AddRow("", $"false failure at most {Numbers.AtMost(limits.FalseFailure.Upper)}, "
                + $"missed defect at most {Numbers.AtMost(limits.MissedDefect.Upper)}");
        if (plan.FirstTrials < plan.FixedTrials)
            grid.AddRow("", $"({Numbers.Text(plan.FirstTrials)} is the first number that works; from {Numbers.Text(plan.FixedTrials)} on, every number does)");
        return grid;
    }

    static string Region(Plan plan)
    {
        if (plan.Limits is not { } limits)
            return $"by {plan.Theorem}";
        if (limits.AcceptLow <= 0)
            return $"upheld by {Numbers.Text(limits.AcceptHigh)} successes or fewer";
        return limits.AcceptHigh >= limits.Trials
            ? $"upheld by {Numbers.Text(limits.AcceptLow)} successes or more"
            : $"upheld by {Numbers.Text(limits.AcceptLow)} to {Numbers.Text(limits.AcceptHigh)} successes";
    }

    static Table Theorems(Plan plan)
    {
        var table = new Table().Border(TableBorder.Simple)
            .AddColumn("Theorem").AddColumn("Trials", column => column.RightAligned())
            .AddColumn("Ratio", column => column.RightAligned()).AddColumn("Assumes");
        foreach (var theorem in plan.Alternatives)
        {
            table.AddRow(
                theorem.Name,
                theorem.Trials is { } trials ? Numbers.Text(trials) : "none",
                theorem.Trials is { } needed ? Numbers.Ratio((double)needed / plan.FixedTrials) : "",
                theorem.Assumes);
        }

        return table;
    }

    static string Trials(double expected) => Numbers.Text((long)Math.Ceiling(expected));
}
