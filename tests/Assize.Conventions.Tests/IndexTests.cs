using System.Text.RegularExpressions;

namespace Assize.Conventions.Tests;

/// <summary>Tables of claims and rules are written from the code and its pages, never by hand.</summary>
public partial class IndexTests
{
    [Fact]
    public void The_table_of_claims_lists_every_factory()
    {
        var factories = typeof(Claim).GetMethods()
            .Where(method => method is { IsStatic: true, IsPublic: true, IsSpecialName: false })
            .DistinctBy(method => method.Name)
            .OrderBy(method => method.Name, StringComparer.Ordinal)
            .Select(method => $"| `Claim.{method.Name}({string.Join(", ", method.GetParameters().Select(parameter => parameter.Name))})` | {Summary(method.Name)} |\n")
            .ToArray();

        Assert.True(factories.Length >= 6, $"only {factories.Length} factories seen");
        Testing.Repository.MustContain("README.md", "claims", "| claim | says |\n| --- | --- |\n" + string.Concat(factories));
    }

    [Fact]
    public void The_table_of_rules_lists_every_page()
    {
        var pages = Testing.Repository.Files("analyzers/docs", "ASZ*.md")
            .Select(page => (Page: page, Title: Testing.Repository.Read($"analyzers/docs/{page}").Split('\n')[0]))
            .Select(page => (page.Page, Title: Heading().Match(page.Title)))
            .Select(page => $"| [{page.Title.Groups[1].Value}](analyzers/docs/{page.Page}) | {page.Title.Groups[2].Value} |\n")
            .ToArray();

        Assert.True(pages.Length >= 4, $"only {pages.Length} pages seen");
        Testing.Repository.MustContain("README.md", "rules", "| rule | says |\n| --- | --- |\n" + string.Concat(pages));
    }

    // The first sentence of the factory's documentation, from the file the compiler wrote.
    static string Summary(string factory)
    {
        string documentation = File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Assize.xml"));
        var summary = Regex.Match(documentation, $@"<member name=""M:Assize\.Claim\.{factory}(?:``\d)?\([^""]*"">\s*<summary>(.*?)</summary>", RegexOptions.Singleline);
        Assert.True(summary.Success, $"{factory} has no summary");
        return summary.Groups[1].Value.Trim();
    }

    [GeneratedRegex(@"^# (ASZ\d{4})\W+(.+)$")]
    private static partial Regex Heading();
}
