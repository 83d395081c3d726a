using Spectre.Console;

namespace Assize.Cli;

/// <summary>A tally as people read it: who spends the budget, then whether it is kept.</summary>
static class TallyText
{
    public static void Write(IAnsiConsole page, TallyResult result)
    {
        page.Write(Spenders(result.Spent));
        page.WriteLine();
        page.Write(Totals(result));
        page.WriteLine();
        page.MarkupLine(result.Exit switch
        {
            ExitCode.Kept => "[green]All kept.[/]",
            ExitCode.Red => $"[red]{result.Tally.Count(Outcome.Refuted)} refuted, {result.Tally.Count(Outcome.Undecided)} undecided.[/]",
            _ => "[yellow]Not kept:[/] the claims' risks exceed the budget. Lower the risk of the tests at the top of the table.",
        });
    }

    static Table Spenders(IReadOnlyList<Spending> spent)
    {
        var table = new Table().Border(TableBorder.Simple)
            .AddColumn("Risk at most", column => column.RightAligned()).AddColumn("Claims", column => column.RightAligned())
            .AddColumn("Trials", column => column.RightAligned()).AddColumn("Test");
        foreach (var one in spent)
            table.AddRow(Numbers.AtMost(one.Risk), Numbers.Text(one.Claims), Numbers.Text(one.Trials), Markup.Escape(one.Test));
        return table;
    }

    static Grid Totals(TallyResult result)
    {
        var tally = result.Tally;
        var grid = new Grid().AddColumn(new GridColumn().NoWrap().PadRight(3)).AddColumn();
        grid.AddRow("Claims", $"{tally.Entries.Count} judged in {Numbers.Text(tally.Trials)} trials: "
            + $"{tally.Count(Outcome.Upheld)} upheld, {tally.Count(Outcome.Refuted)} refuted, {tally.Count(Outcome.Undecided)} undecided");
        grid.AddRow("Budget", $"a healthy run is falsely red with probability at most {Numbers.AtMost(tally.FalseFailure)} by its claims; "
            + $"{Numbers.Text(tally.Budget)} is allowed");
        grid.AddRow("", $"(if the claims were independent: {Numbers.AtMost(tally.IfIndependent)}; the budget does not rest on it)");
        if (result.TornLines > 0)
            grid.AddRow("Ledger", $"{result.TornLines} torn lines: a process ended while it wrote, and those claims are not counted");
        return grid;
    }
}
