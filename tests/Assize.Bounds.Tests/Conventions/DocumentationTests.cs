using System.Xml.Linq;
using Assize.Testing;

namespace Assize.Bounds.Tests.Conventions;

/// <summary>A theorem is one file, one test file, one page, and four paragraphs that say what it promises.</summary>
public class DocumentationTests
{
    static readonly string[] Paragraphs = ["Holds for: ", "Guarantee: ", "Accuracy: ", "Source: "];

    static string[] Theorems =>
        [.. Repository.Files("src/Assize.Bounds/Tails", "*.cs").Select(file => Path.GetFileNameWithoutExtension(file)!)];

    [Fact]
    public void Every_theorem_says_what_it_holds_for_guarantees_measures_and_cites()
    {
        var documentation = XDocument.Load(Path.Combine(AppContext.BaseDirectory, "Assize.Bounds.xml"));
        int seen = 0;
        foreach (string theorem in Theorems)
        {
            var member = documentation.Descendants("member").Single(
                item => item.Attribute("name")!.Value == $"T:Assize.Bounds.{theorem}");
            string[] paragraphs = [.. member.Descendants("para").Select(item => item.Value.Trim())];
            Assert.True(Misses(paragraphs) is null, $"{theorem}: {Misses(paragraphs)}");
            seen++;
        }

        Assert.True(seen >= 15, $"only {seen} theorems");
    }

    [Fact]
    public void A_missing_or_misplaced_paragraph_is_noticed()
    {
        Assert.NotNull(Misses(["Holds for: draws.", "Guarantee: safe.", "Source: a book."]));
        Assert.NotNull(Misses(["Guarantee: safe.", "Holds for: draws.", "Accuracy: 1e-9.", "Source: a book."]));
        Assert.Null(Misses(["Holds for: draws.", "Guarantee: safe.", "Accuracy: 1e-9.", "Source: a book."]));
    }

    static string? Misses(string[] paragraphs) =>
        paragraphs.Length != Paragraphs.Length ? $"{paragraphs.Length} paragraphs instead of {Paragraphs.Length}"
        : Paragraphs.Zip(paragraphs).FirstOrDefault(pair => !pair.Second.StartsWith(pair.First, StringComparison.Ordinal)).First is { } missing
            ? $"the paragraph '{missing}' is not where it belongs"
            : null;

    [Fact]
    public void Every_theorem_has_a_public_type_a_test_and_a_page_of_the_agreed_shape()
    {
        string[] headings =
        [
            "## Statement", "## Holds for", "## Measured accuracy", "## Checked against", "## Source",
            "## When to prefer another",
        ];
        int seen = 0;
        foreach (string theorem in Theorems)
        {
            Assert.True(
                typeof(RatePlan).Assembly.GetType($"Assize.Bounds.{theorem}") is { IsPublic: true },
                $"{theorem} is no public type");
            Assert.NotNull(typeof(DocumentationTests).Assembly.GetType($"Assize.Bounds.Tests.{theorem}Tests"));
            string page = Repository.Read($"src/docs/tails/{theorem}.md");
            Assert.StartsWith($"# {theorem}\n", page, StringComparison.Ordinal);
            int[] places = [.. headings.Select(heading => page.IndexOf($"\n{heading}\n", StringComparison.Ordinal))];
            Assert.True(
                places.All(place => place > 0) && places.Order().SequenceEqual(places),
                $"{theorem}.md lacks or misplaces a heading");
            seen++;
        }

        Assert.True(seen >= 15, $"only {seen} theorems");
        Assert.Equal(Theorems.Select(theorem => $"{theorem}.md"), Repository.Files("src/docs/tails", "*.md"));
    }
}
