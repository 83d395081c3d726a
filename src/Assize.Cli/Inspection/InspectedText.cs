using Spectre.Console;

namespace Assize.Cli;

/// <summary>An inspection as people read it: what to mend, worst first, then everything that was read, then the sum.</summary>
static class InspectedText
{
    public static void Write(Desk desk, Inspected inspected)
    {
        var page = desk.Page();
        foreach (var (place, finding) in inspected.Findings)
        {
            page.MarkupLine($"[{(finding.Stands ? "yellow" : "dim")}]{finding.Rule}[/]  {Where(place, inspected)}  [dim]{Safe(place.Method)}[/]");
            page.Write(new Padder(new Text(Inert.Line(finding.Message))).Padding(9, 0, 0, 0));
        }

        if (inspected.Findings.Any())
            page.WriteLine();
        if (inspected.Assertions.Count > 0)
            page.Write(Table(inspected));
        page.Write(Totals(inspected));
        foreach (string note in inspected.Notes)
            page.MarkupLine($"[dim]{Safe(note)}[/]");
        page.WriteLine();
        page.MarkupLine(inspected.Exit == ExitCode.Kept ? "[green]All kept.[/]" : "[yellow]Not kept:[/] " + Safe(Reasons(inspected)));
    }

    static Table Table(Inspected inspected)
    {
        var table = new Table().Border(TableBorder.Simple)
            .AddColumn("Assertion").AddColumn("Asks of").AddColumn("Trials", column => column.RightAligned())
            .AddColumn("Falsely red").AddColumn("Catches").AddColumn("To do");
        foreach (var assertion in inspected.Assertions)
        {
            table.AddRow(
                Where(assertion.Place, inspected),
                Safe($"{assertion.Statistic}, {assertion.Shape}"),
                AssertionWords.Trials(assertion.Trials),
                AssertionWords.FalseFailure(assertion),
                AssertionWords.Catches(assertion),
                AssertionWords.Todo(assertion));
        }

        return table;
    }

    static Grid Totals(Inspected inspected)
    {
        var grid = new Grid().AddColumn(new GridColumn().NoWrap().PadRight(3)).AddColumn();
        grid.AddRow("Read", Safe(inspected.ReadFrom));
        grid.AddRow("Assertions", AssertionWords.Totals(inspected));
        if (inspected.Claims.Count > 0)
            grid.AddRow("Claims", $"{Numbers.Text(inspected.Claims.Count)} of the kit, each within its own risk");
        grid.AddRow("Sum", AssertionWords.Sum(inspected));
        return grid;
    }

    static string Reasons(Inspected inspected)
    {
        int standing = inspected.Findings.Count(found => found.Finding.Stands);
        string[] reasons =
        [
            .. standing == 0 ? (string[])[] : [standing == 1 ? "one finding stands" : $"{Numbers.Text(standing)} findings stand"],
            .. inspected.WithinBudget ? (string[])[] : ["the assertions exceed the budget"],
        ];
        return string.Join(", and ", reasons) + ".";
    }

    static string Where(Place place, Inspected inspected) => Safe($"{inspected.Relative(place)}:{place.Line}");

    static string Safe(string text) => Markup.Escape(Inert.Line(text));
}
