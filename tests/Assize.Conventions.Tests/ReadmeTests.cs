using System.Text.RegularExpressions;

namespace Assize.Conventions.Tests;

/// <summary>The README shows only code that is compiled and run, and only commands that work.</summary>
public partial class ReadmeTests
{
    [Fact]
    public void Every_block_of_code_stands_in_the_samples() => StandsInTheSamples("README.md");

    [Fact]
    public void So_does_every_block_of_the_pages_of_claims()
    {
        var pages = Testing.Repository.Files("src/docs/claims", "*.md");

        Assert.NotEmpty(pages);
        Assert.All(pages, page => StandsInTheSamples($"src/docs/claims/{page}"));
    }

    static void StandsInTheSamples(string page)
    {
        var samples = Sources.Below("samples").Select(file => Flat(File.ReadAllText(file))).ToArray();
        var blocks = CodeBlock().Matches(Testing.Repository.Read(page)).Select(match => Flat(match.Groups[1].Value)).ToArray();

        Assert.NotEmpty(blocks);
        Assert.All(blocks, block => Assert.Contains(samples, sample => sample.Contains(block, StringComparison.Ordinal)));
    }

    [Fact]
    public void The_test_command_is_the_one_that_continuous_integration_runs()
    {
        const string command = "dotnet test Kit.sln -c Release";

        Assert.Contains(command + "\n", Testing.Repository.Read("README.md"), StringComparison.Ordinal);
        Assert.Contains(command + " ", Testing.Repository.Read(".ci/run"), StringComparison.Ordinal);
    }

    // Indentation and line breaks are the page's own.
    static string Flat(string text) => Whitespace().Replace(text, " ").Trim();

    [GeneratedRegex("```csharp\n(.*?)```", RegexOptions.Singleline)]
    private static partial Regex CodeBlock();

    [GeneratedRegex(@"\s+")]
    private static partial Regex Whitespace();
}
