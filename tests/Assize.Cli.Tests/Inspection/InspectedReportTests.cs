using System.Text.Json;
using Assize.Bounds;

namespace Assize.Cli.Tests;

/// <summary>Names and paths that try to be more than text, in every format.</summary>
public class InspectedReportTests
{
    const string Hostile = "a`b|c<script>[x](http:/e) @all \u001b[31m\u202e\"&.cs";

    static readonly Inspected Report = new(
        "/root",
        "plain sources",
        [$"{Hostile} was left out."],
        [
            new InspectedAssertion(new Place($"/root/{Hostile}", 3, 5, 3, 9, "T.M", 1, 4))
            {
                Framework = "Xunit",
                Shape = "counted in a loop",
                Statistic = "proportion",
                Trials = 100,
                Seed = "fresh",
                FalseFailure = new Enclosure(0.1, 0.1),
                Findings = [new InspectedFinding("ASZ2001", "warning", $"data row {Hostile}")],
            },
            new InspectedAssertion(new Place("/root/b.cs", 1, 1, 1, 2, "T.N", 1, 2))
            {
                Framework = "Xunit", Shape = "counted in a loop", Statistic = "mean", Seed = "fresh", Findings = [],
            },
        ],
        [],
        0.01);

    [Fact]
    public void Markdown_shows_them_as_text()
    {
        string page = InspectedMarkdown.Write(Report);

        Assert.DoesNotContain("\u001b", page, StringComparison.Ordinal);
        Assert.DoesNotContain("\u202e", page, StringComparison.Ordinal);
        // Outside code spans nothing is markup, a link or a mention.
        string outside = System.Text.RegularExpressions.Regex.Replace(page, "(`+).*?\\1(?!`)", "");
        Assert.DoesNotContain("<script", outside.Replace("\\<", "", StringComparison.Ordinal), StringComparison.Ordinal);
        Assert.DoesNotContain("@all", outside, StringComparison.Ordinal);
        Assert.DoesNotContain("http:/", outside, StringComparison.Ordinal);
        // Six borders and one inside a name in the first row.
        string row = page.Split('\n').Single(line => line.StartsWith("| ``", StringComparison.Ordinal));
        Assert.Equal(7, row.Replace("\\|", "", StringComparison.Ordinal).Count(letter => letter == '|'));
    }

    // Members that the schema of the OASIS standard requires, checked by hand: runs, tool.driver.name, message, and a URI without bare characters.
    [Fact]
    public void Sarif_has_what_the_standard_requires()
    {
        using var log = JsonDocument.Parse(InspectedSarif.Write(Report));

        Assert.Equal("2.1.0", log.RootElement.GetProperty("version").GetString());
        var run = Assert.Single(log.RootElement.GetProperty("runs").EnumerateArray());
        var driver = run.GetProperty("tool").GetProperty("driver");
        Assert.Equal("assize", driver.GetProperty("name").GetString());
        string[] ids = [.. driver.GetProperty("rules").EnumerateArray().Select(rule => rule.GetProperty("id").GetString()!)];
        Assert.Equal(ids.Distinct().Order(StringComparer.Ordinal), ids);
        var result = Assert.Single(run.GetProperty("results").EnumerateArray());
        Assert.Equal("ASZ2001", ids[result.GetProperty("ruleIndex").GetInt32()]);
        Assert.Contains(result.GetProperty("level").GetString(), new[] { "none", "note", "warning", "error" });
        Assert.Contains("\\[x\\](", result.GetProperty("message").GetProperty("text").GetString(), StringComparison.Ordinal);
        var place = result.GetProperty("locations")[0].GetProperty("physicalLocation");
        string uri = place.GetProperty("artifactLocation").GetProperty("uri").GetString()!;
        Assert.True(Uri.IsWellFormedUriString(uri, UriKind.Relative), uri);
        Assert.Equal(Hostile, Uri.UnescapeDataString(uri));
        Assert.Equal(3, place.GetProperty("region").GetProperty("startLine").GetInt32());
        Assert.Equal("file:///root/", run.GetProperty("originalUriBaseIds").GetProperty("ROOT").GetProperty("uri").GetString());
    }

    [Fact]
    public void A_terminal_gets_no_escape_sequence()
    {
        using StringWriter output = new();
        InspectedText.Write(new Desk(output, output, IsTerminal: false, "/root"), Report);

        Assert.DoesNotContain("\u001b", output.ToString(), StringComparison.Ordinal);
        Assert.Contains("U+001B[31mU+202E", output.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void What_nothing_bounds_is_counted_apart()
    {
        Assert.Equal((2, 1, 1), (Report.Assertions.Count, Report.Assessed, Report.Unbounded));
        Assert.InRange(Report.FalseFailureUpper, 0.1, 0.1 + 1e-9);
        Assert.False(Report.WithinBudget);
    }
}
