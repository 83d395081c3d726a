using System.Globalization;
using System.Text.Json;

namespace Assize.Cli.Tests.Commands;

public sealed class InspectPageTests : IDisposable
{
    readonly string _folder = Directory.CreateTempSubdirectory("assize-inspect-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    // Answers by exact binomial tails in 30-digit arithmetic; their table says which program computed them.
    [Fact]
    public async Task Every_answer_of_the_miniatures_is_in_the_report()
    {
        using var miniatures = new Miniatures();
        var (exit, output, errors) = await TestDesk.SayAsync("inspect", miniatures.Folder, "--json");

        Assert.True(exit == 2, errors);
        using var report = JsonDocument.Parse(output);
        var found = report.RootElement.GetProperty("assertions").EnumerateArray()
            .ToDictionary(item => $"{item.GetProperty("file").GetString()}:{item.GetProperty("line").GetInt32()}");
        var answers = Miniatures.Table("answers.csv");
        Assert.Equal(15, answers.Count);
        foreach (string[] answer in answers)
        {
            var item = found[$"{answer[0]}:{answer[1]}"];
            Assert.Equal(answer[3], item.GetProperty("trials").GetInt64().ToString(CultureInfo.InvariantCulture));
        }

        Assert.DoesNotContain(Miniatures.Table("silent.csv"), silent => found.TryGetValue($"{silent[0]}:{silent[1]}", out var item)
            && item.GetProperty("rules").GetArrayLength() > 0);
    }

    [Fact]
    public async Task The_chance_of_red_is_enclosed_and_added_up()
    {
        // 180…220 successes of 400 at a half are missed once in 24.86 runs, 1,851…2,150 of 10,000 at a fifth once in 5,659.6: whole-number arithmetic.
        Write("CoinTests.cs", Test("400", "180", "220") + Test("10_000", "1_851", "2_150", "rng.Next(5) == 0"));
        using var report = await JsonAsync("inspect", _folder, "--json");

        var chances = report.RootElement.GetProperty("assertions").EnumerateArray().Select(item => item.GetProperty("falseFailure")).ToList();
        Assert.Equal(2, chances.Count);
        Assert.InRange(1 / 24.86, chances[0].GetProperty("lower").GetDouble() * 0.999, chances[0].GetProperty("upper").GetDouble() * 1.001);
        Assert.InRange(1 / 5659.6, chances[1].GetProperty("lower").GetDouble() * 0.999, chances[1].GetProperty("upper").GetDouble() * 1.001);
        Assert.InRange(
            report.RootElement.GetProperty("totals").GetProperty("falseFailureUpper").GetDouble(), 1 / 24.86 + (1 / 5659.6) - 1e-5, 0.0405);
    }

    [Theory]
    [InlineData(null, 0)]
    [InlineData("1e-30", 2)]
    [InlineData("0.5", 0)]
    public async Task The_exit_code_is_the_budgets(string? budget, int expected)
    {
        Write("CoinTests.cs", Test("10_000", "4_500", "5_500"));

        var (exit, _, errors) = await TestDesk.SayAsync(budget is null ? ["inspect", _folder] : ["inspect", _folder, "--budget", budget]);

        Assert.True(exit == expected, errors);
    }

    [Fact]
    public async Task Code_that_does_not_compile_and_a_framework_that_is_not_there_are_read()
    {
        Write("CoinTests.cs", Test("400", "180", "220") + "class Broken { void M( { int x = ; } }");
        using var report = await JsonAsync("inspect", _folder, "--json");

        Assert.Equal(["ASZ2001", "ASZ2005"], Rules(Assert.Single(report.RootElement.GetProperty("assertions").EnumerateArray())));
    }

    [Fact]
    public async Task A_project_without_its_packages_is_read_as_plain_sources_and_says_so()
    {
        Write("Coins.csproj", """<Project Sdk="Microsoft.NET.Sdk"><PropertyGroup><TargetFramework>net10.0</TargetFramework></PropertyGroup></Project>""");
        Write("CoinTests.cs", Test("400", "180", "220"));
        using var report = await JsonAsync("inspect", Path.Combine(_folder, "Coins.csproj"), "--json");

        Assert.Single(report.RootElement.GetProperty("assertions").EnumerateArray());
        Assert.Contains("plain sources", report.RootElement.GetProperty("readFrom").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Settings_and_suppressions_apply_as_in_a_build()
    {
        Write(".editorconfig", "root = true\n[*.cs]\nassize.risk_limit = 0.05\n");
        Write("CoinTests.cs", Test("400", "180", "220"));
        Write("MutedTests.cs", "#pragma warning disable ASZ2001, ASZ2003\n" + Test("100", "45", "55"));
        var (exit, output, _) = await TestDesk.SayAsync("inspect", _folder, "--json");

        using var report = JsonDocument.Parse(output);
        Assert.All(report.RootElement.GetProperty("assertions").EnumerateArray(), item => Assert.DoesNotContain("ASZ2001", Rules(item)));
        Assert.Equal(0, exit);
    }

    [Fact]
    public async Task Claims_of_the_kit_are_listed_beside()
    {
        Write("ClaimTests.cs", """
            using Assize; using Xunit;
            public class ClaimTests
            {
                [Fact] public void It() => Claim.Rate(0.5, tolerance: 0.1).WithTrials(100).MustHold(rng => rng.Next(2) == 0);
            }
            """);
        using var report = await JsonAsync("inspect", _folder, "--json");

        var claim = Assert.Single(report.RootElement.GetProperty("claims").EnumerateArray());
        Assert.Equal(["ASZ1001"], Rules(claim));
        Assert.Equal(100, claim.GetProperty("trials").GetInt64());
    }

    [Fact]
    public async Task Only_tests_with_changed_lines_are_wanted_since_a_revision()
    {
        await GitAsync("init", "-q");
        Write("OldTests.cs", Test("400", "180", "220"));
        Write("ChangedTests.cs", Test("400", "180", "220"));
        await GitAsync("add", ".");
        await GitAsync("-c", "user.name=T", "-c", "user.email=t@t", "commit", "-qm", "first");
        Write("ChangedTests.cs", Test("500", "225", "275"));
        Write("New\ttests \"é\".cs", Test("300", "135", "165"));
        using var report = await JsonAsync("inspect", _folder, "--since", "HEAD", "--json");

        var trials = report.RootElement.GetProperty("assertions").EnumerateArray().Select(item => item.GetProperty("trials").GetInt64());
        Assert.Equal([300, 500], trials.Order());
    }

    [Fact]
    public async Task A_revision_that_is_not_there_could_not_run()
    {
        await GitAsync("init", "-q");
        var (exit, _, errors) = await TestDesk.SayAsync("inspect", _folder, "--since", "--output=x");

        Assert.Equal(3, exit);
        Assert.Contains("git", errors, StringComparison.Ordinal);
        Assert.False(File.Exists(Path.Combine(_folder, "x")));
    }

    [Theory]
    [InlineData("Nowhere", "does not exist")]
    [InlineData("README.md", "neither a solution nor a C# project")]
    public async Task A_path_that_cannot_be_read_is_named(string path, string reason)
    {
        var (exit, _, errors) = await TestDesk.SayAsync("inspect", path);

        Assert.Equal(3, exit);
        Assert.Contains(reason, errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Help_shows_an_example()
    {
        var (exit, output, _) = await TestDesk.SayAsync("inspect", "--help");

        Assert.Equal(0, exit);
        Testing.Repository.MustEqual(
            "tests/Assize.Cli.Tests/Commands/inspect-help.txt",
            string.Join('\n', output.Split('\n').Select(line => line.TrimEnd())).TrimEnd() + "\n");
    }

    static int tests;

    static string Test(string trials, string low, string high, string draw = "rng.Next(2) == 0") => $$"""
        namespace N{{Interlocked.Increment(ref tests)}}
        {
            public class CoinTests
            {
                [Xunit.Fact]
                public void Heads_are_fair()
                {
                    var rng = new System.Random();
                    int heads = 0;
                    for (int i = 0; i < {{trials}}; i++)
                        if ({{draw}}) heads++;
                    Xunit.Assert.InRange(heads, {{low}}, {{high}});
                }
            }
        }

        """;

    void Write(string file, string text) => File.WriteAllText(Path.Combine(_folder, file), text);

    static string[] Rules(JsonElement item) => [.. item.GetProperty("rules").EnumerateArray().Select(rule => rule.GetString()!)];

    static async Task<JsonDocument> JsonAsync(params string[] line)
    {
        var (exit, output, errors) = await TestDesk.SayAsync(line);
        Assert.True(exit is 0 or 2, errors);
        return JsonDocument.Parse(output);
    }

    async Task GitAsync(params string[] arguments)
    {
        var start = new System.Diagnostics.ProcessStartInfo("git", arguments) { WorkingDirectory = _folder };
        Assert.Equal(0, await ChildProcess.RunAsync(start, _ => { }, TestContext.Current.CancellationToken));
    }
}
