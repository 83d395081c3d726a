using System.Text.RegularExpressions;

namespace Assize.Analyzers.Tests;

/// <summary>The page of every rule: its table is compared with the descriptor, and its examples are run.</summary>
public class PageTests
{
    static readonly string[] Sections = ["Why", "Reported", "Not reported", "When to suppress"];

    [Fact]
    public void Every_rule_has_a_page_and_every_page_a_rule()
    {
        var pages = Directory.GetFiles(Repository.Path("analyzers", "docs"), "ASZ*.md").Select(
            path => Path.GetFileNameWithoutExtension(path)!);
        var rules = RandomizedTests.Rules.Select(rule => rule.Descriptor.Id).ToList();

        Assert.Equal(9, rules.Count);
        Assert.Equal(rules, pages.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Titles_tables_and_sections_are_those_of_the_rules()
    {
        int compared = 0;
        foreach (var descriptor in RandomizedTests.Rules.Select(rule => rule.Descriptor))
        {
            string page = Page(descriptor.Id);
            string fix = new RaiseTrialsFix().FixableDiagnosticIds.Contains(descriptor.Id) ? "Raise the trials"
                : "none";
            string expected =
                $"# {descriptor.Id}: {descriptor.Title}\n\n| | |\n| --- | --- |\n| Id | {descriptor.Id} |\n"
                + $"| Severity | {descriptor.DefaultSeverity} |\n| Category | {descriptor.Category} |\n| Fix | {fix} |\n\n## Why\n";
            Assert.StartsWith(expected, page, StringComparison.Ordinal);
            Assert.Equal(
                Sections, Regex.Matches(page, "^## (.+)$", RegexOptions.Multiline)
                .Select(found => found.Groups[1].Value));
            compared++;
        }

        Assert.Equal(9, compared);
    }

    [Fact]
    public void The_release_notes_list_every_rule()
    {
        string notes = Repository.Read("analyzers", "Assize.Analyzers", "AnalyzerReleases.Unshipped.md")
            + Repository.Read("analyzers", "Assize.Analyzers", "AnalyzerReleases.Shipped.md");
        var rows = RandomizedTests.Rules.Select(rule =>
            $"{rule.Descriptor.Id} | {rule.Descriptor.Category} | {rule.Descriptor.DefaultSeverity} | {rule.GetType().Name}\n");

        Assert.All(rows, row => Assert.Contains(row, notes, StringComparison.Ordinal));
    }

    [Fact]
    public async Task Examples_do_what_the_page_says()
    {
        int run = 0;
        foreach (var id in RandomizedTests.Rules.Select(rule => rule.Descriptor.Id))
        {
            foreach (var (section, example, settings) in Examples(Page(id)))
            {
                Assert.Equal(section == "Reported", example.Contains("[|", StringComparison.Ordinal));
                await Verify.Rule(id, example, settings);
                run++;
            }
        }

        Assert.Equal(32, run);
    }

    static string Page(string id) => Repository.Read("analyzers", "docs", id + ".md");

    static IEnumerable<(string Section, string Example, Dictionary<string, string> Settings)> Examples(string page)
    {
        var settings = Regex.Matches(page, @"With `(assize\.\w+) = ([^`]+)`").ToDictionary(
            found => found.Groups[1].Value, found => found.Groups[2].Value);
        foreach (string section in Sections)
        {
            string text = page[page.IndexOf($"## {section}\n", StringComparison.Ordinal)..];
            int end = text.IndexOf("\n## ", StringComparison.Ordinal);
            foreach (Match block in Regex.Matches(
                end < 0 ? text : text[..end], "```csharp\n(.*?)```", RegexOptions.Singleline))
                yield return (section, block.Groups[1].Value, settings);
        }
    }
}
