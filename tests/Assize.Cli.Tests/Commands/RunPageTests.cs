using System.Text.Json;
using System.Text.RegularExpressions;

namespace Assize.Cli.Tests.Commands;

/// <summary>The whole job on the sample suites, built apart from the assemblies these tests run from.</summary>
public sealed partial class RunPageTests : IDisposable
{
    const string Seed = "0000000000000b1c";

    readonly string? _seed = Environment.GetEnvironmentVariable("ASSIZE_SEED");
    readonly string? _artifacts = Environment.GetEnvironmentVariable("ArtifactsPath");

    public RunPageTests()
    {
        Environment.SetEnvironmentVariable("ASSIZE_SEED", Seed);
        Environment.SetEnvironmentVariable("ArtifactsPath", Path.Combine(Testing.Repository.Root, "artifacts", "run-tests"));
    }

    public void Dispose()
    {
        Environment.SetEnvironmentVariable("ASSIZE_SEED", _seed);
        Environment.SetEnvironmentVariable("ArtifactsPath", _artifacts);
    }

    [Fact]
    public async Task Healthy_suites_of_both_frameworks_are_kept()
    {
        var (exit, output, errors) = await TestDesk.SayAsync("run", "samples/Bicycles.Xunit", "samples/Bicycles.NUnit", "--json");

        Assert.True(exit == 0, errors + output);
        using var result = JsonDocument.Parse(output);
        var claims = result.RootElement.GetProperty("claims");
        int judged = claims.GetProperty("judged").GetInt32();
        Assert.True(judged >= 17, $"{judged} claims");
        Assert.Equal(judged, claims.GetProperty("upheld").GetInt32());
        var budget = result.RootElement.GetProperty("budget");
        // Every claim of the samples has the usual risk.
        Assert.Equal(judged * 1e-9, budget.GetProperty("falseFailureUpper").GetDouble(), 1e-15);
        Assert.True(budget.GetProperty("kept").GetBoolean());
        Assert.Empty(result.RootElement.GetProperty("findings").EnumerateArray());
    }

    [Fact]
    public async Task A_budget_that_is_too_small_is_not_kept()
    {
        var (exit, output, _) = await TestDesk.SayAsync("run", "samples/Bicycles.NUnit", "--budget", "5e-9");

        Assert.Equal(2, exit);
        Assert.Matches(@"at most [\d.e-]+ by its claims; 5e-9 is allowed", output);
    }

    [Fact]
    public async Task A_biased_shuffle_is_refuted_and_flaky_tests_are_found()
    {
        var (exit, output, _) = await TestDesk.SayAsync("run", "samples/Flawed");

        Assert.Equal(1, exit);
        // Exact binomial tails by whole-number arithmetic: 1 in 24.86 for 180…220 of 400 at ½, 1 in 5,659.6 for 1,851…2,150 of 10,000 at ⅕.
        Assert.Contains("Red in at least 1 of 25 runs on healthy code", output, StringComparison.Ordinal);
        Assert.Contains("Red in at least 1 of 5,660 runs on healthy code", output, StringComparison.Ordinal);
        Assert.Contains("1 judged in", output, StringComparison.Ordinal);
        // xunit v3's own words: a refuted claim is a failure, not an error.
        Assert.Contains("Total: 4, Errors: 0, Failed: 1", output, StringComparison.Ordinal);
        Assert.Contains("Findings   2 in hand-written tests and claims", output, StringComparison.Ordinal);
        Assert.Equal(Failure(Testing.Repository.Read("README.md")), Failure(output));
    }

    [Fact]
    public async Task A_path_that_is_not_there_is_named()
    {
        var (exit, _, errors) = await TestDesk.SayAsync("run", "samples/Nowhere");

        Assert.Equal(3, exit);
        Assert.Contains("'samples/Nowhere' does not exist.", errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("0")]
    [InlineData("1.5")]
    [InlineData("NaN")]
    public async Task A_budget_that_is_no_probability_is_refused(string budget)
    {
        var (exit, _, errors) = await TestDesk.SayAsync("run", "samples/Bicycles.NUnit", "--budget", budget);

        Assert.Equal(3, exit);
        Assert.Contains("The budget must be a probability in (0, 1]", errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Help_shows_an_example()
    {
        var (exit, output, _) = await TestDesk.SayAsync("run", "--help");

        Assert.Equal(0, exit);
        Testing.Repository.MustEqual(
            "tests/Assize.Cli.Tests/Commands/run-help.txt",
            string.Join('\n', output.Split('\n').Select(line => line.TrimEnd())).TrimEnd() + "\n");
    }

    // From the headline to the command that replays: the same draws give the same text, line by line.
    static string Failure(string text) => string.Join('\n', FailureText().Match(text).Value.Split('\n').Select(line => line.Trim()));

    [GeneratedRegex(@"Claim refuted:.*?last trial[^\n]*", RegexOptions.Singleline)]
    private static partial Regex FailureText();
}
