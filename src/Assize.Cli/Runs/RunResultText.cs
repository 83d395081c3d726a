using Spectre.Console;

namespace Assize.Cli;

/// <summary>A run as people read it: what stands against it last, since that is where the eye is.</summary>
static class RunResultText
{
    public static void Write(Desk desk, RunResult result)
    {
        var page = desk.Page();
        page.WriteLine();
        foreach (var finding in result.Findings)
        {
            string place = finding.File.Length == 0 ? "" : $"{Path.GetRelativePath(desk.Folder, finding.File)}:{finding.Line}";
            page.MarkupLine($"[{(finding.Stands ? "yellow" : "dim")}]{finding.Rule}[/]  {Markup.Escape(place)}");
            page.Write(new Padder(new Text(finding.Message)).Padding(9, 0, 0, 0));
        }

        if (result.Findings.Count > 0)
            page.WriteLine();
        page.Write(Totals(result));
        page.WriteLine();
        page.MarkupLine(result.Exit switch
        {
            ExitCode.Kept => "[green]All kept.[/]",
            ExitCode.Red => $"[red]Tests are red in {Markup.Escape(string.Join(", ", result.RedProjects))}.[/]",
            _ => "[yellow]Not kept:[/] " + Markup.Escape(Reasons(result)),
        });
    }

    static Grid Totals(RunResult result)
    {
        var tally = result.Tally;
        var grid = new Grid().AddColumn(new GridColumn().NoWrap().PadRight(3)).AddColumn();
        grid.AddRow("Claims", $"{tally.Entries.Count} judged in {Numbers.Text(tally.Trials)} trials: "
            + $"{tally.Count(Outcome.Upheld)} upheld, {tally.Count(Outcome.Refuted)} refuted, {tally.Count(Outcome.Undecided)} undecided");
        grid.AddRow("Budget", $"a healthy run is falsely red with probability at most {Numbers.AtMost(tally.FalseFailure)} by its claims; "
            + $"{Numbers.Text(tally.Budget)} is allowed");
        grid.AddRow("Findings", $"{result.Findings.Count(finding => finding.Stands)} in hand-written tests and claims, "
            + $"{result.Findings.Count(finding => !finding.Stands)} suggestions");
        if (result.TornLines > 0)
            grid.AddRow("Ledger", $"{result.TornLines} torn lines: a process ended while it wrote, and those claims are not counted");
        return grid;
    }

    static string Reasons(RunResult result)
    {
        var reasons = new List<string>();
        if (!result.Tally.WithinBudget)
            reasons.Add("the claims' risks exceed the budget");
        int standing = result.Findings.Count(finding => finding.Stands);
        if (standing > 0)
            reasons.Add(standing == 1 ? "one finding stands" : $"{standing} findings stand");
        return string.Join(", and ", reasons) + ".";
    }
}
