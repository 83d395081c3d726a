using System.Text;

namespace Assize.Cli;

/// <summary>An inspection as a comment on a review.</summary>
static class InspectedMarkdown
{
    // A comment has an end; what does not fit is counted.
    const int MostRows = 100;

    public static string Write(Inspected inspected)
    {
        var text = new StringBuilder();
        text.Append("## Randomized assertions\n\n");
        text.Append(inspected.Exit == ExitCode.Kept ? "All kept. " : "**Not kept.** ");
        text.Append(Sentence(AssertionWords.Totals(inspected))).Append(' ').Append(Sentence(AssertionWords.Sum(inspected))).Append("\n\n");
        var findings = inspected.Findings.ToList();
        foreach (var (place, finding) in findings.Take(MostRows))
        {
            text.Append($"- **{finding.Rule}** {Inert.Code($"{inspected.Relative(place)}:{place.Line}")} {Inert.Code(place.Method)}<br>");
            text.Append(Inert.Markdown(finding.Message)).Append('\n');
        }

        if (findings.Count > MostRows)
            text.Append($"- and {Numbers.Text(findings.Count - MostRows)} more\n");
        if (findings.Count > 0)
            text.Append('\n');
        Table(text, inspected);
        text.Append($"Read: {Inert.Markdown(inspected.ReadFrom)}. A green build is no proof that the code is right.\n");
        foreach (string note in inspected.Notes)
            text.Append($"\n{Inert.Markdown(note)}\n");
        return text.ToString();
    }

    static void Table(StringBuilder text, Inspected inspected)
    {
        if (inspected.Assertions.Count == 0)
            return;
        text.Append("| assertion | asks of | trials | falsely red | catches | to do |\n| --- | --- | --: | --- | --- | --- |\n");
        foreach (var assertion in inspected.Assertions.Take(MostRows))
        {
            text.Append($"| {Inert.Code($"{inspected.Relative(assertion.Place)}:{assertion.Place.Line}")} | {Inert.Markdown(assertion.Statistic)} ")
                .Append($"| {AssertionWords.Trials(assertion.Trials)} | {AssertionWords.FalseFailure(assertion)} ")
                .Append($"| {AssertionWords.Catches(assertion)} | {AssertionWords.Todo(assertion)} |\n");
        }

        if (inspected.Assertions.Count > MostRows)
            text.Append($"\nand {Numbers.Text(inspected.Assertions.Count - MostRows)} more\n");
        text.Append('\n');
    }

    static string Sentence(string text) => Inert.Markdown(char.ToUpperInvariant(text[0]) + text[1..] + ".");
}
