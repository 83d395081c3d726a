using System.Globalization;
using System.Text.Json;

namespace Assize.Cli.Tests.Commands;

public sealed class TallyPageTests : IDisposable
{
    readonly string _folder = Directory.CreateTempSubdirectory("assize-tally-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public async Task Files_and_folders_add_up_and_torn_lines_are_counted()
    {
        Write("a.jsonl", Line("Coin", 1e-9) + Line("Die", 3e-9) + "{\"schema\":1,\"ru");
        string other = Write("b.jsonl", Line("Coin", 2e-9));

        // The same file named twice is still one file.
        var (exit, output, _) = await TestDesk.SayAsync("tally", _folder, other, "--json");

        Assert.Equal(0, exit);
        using var tally = JsonDocument.Parse(output);
        var claims = tally.RootElement.GetProperty("claims");
        Assert.Equal((3, 2, 1), (Whole(claims, "judged"), Whole(claims, "files"), Whole(claims, "tornLines")));
        var spent = tally.RootElement.GetProperty("tests").EnumerateArray().ToArray();
        Assert.Equal([("Coin", 2, 3e-9), ("Die", 1, 3e-9)], spent.Select(test =>
            (test.GetProperty("test").GetString(), Whole(test, "claims"), test.GetProperty("risk").GetDouble())));
        Assert.Equal(6e-9, tally.RootElement.GetProperty("budget").GetProperty("falseFailureUpper").GetDouble());
    }

    [Fact]
    public async Task The_sum_decides_and_the_product_stands_beside_it()
    {
        Write("a.jsonl", Line("Coin", 0.5) + Line("Die", 0.25));

        var (exit, output, _) = await TestDesk.SayAsync("tally", _folder, "--budget", "0.7", "--json");

        // By hand: 1/2 + 1/4 exceeds 0.7, 1 - 1/2 * 3/4 = 5/8 would not.
        Assert.Equal(2, exit);
        using var tally = JsonDocument.Parse(output);
        Assert.Equal(0.75, tally.RootElement.GetProperty("budget").GetProperty("falseFailureUpper").GetDouble());
        Assert.Equal(0.625, tally.RootElement.GetProperty("budget").GetProperty("falseFailureIfIndependent").GetDouble());
    }

    // 10 years of 50 runs a day are 182,625 runs: 1 in 182,625 lies between 5.475e-6 and 5.476e-6.
    [Theory]
    [InlineData(5.475e-6, 0)]
    [InlineData(5.476e-6, 2)]
    public async Task One_false_red_in_ten_years_is_a_budget(double risk, int expected)
    {
        Write("a.jsonl", Line("Coin", risk));

        var (exit, _, _) = await TestDesk.SayAsync("tally", _folder, "--years", "10", "--runs-per-day", "50");

        Assert.Equal(expected, exit);
    }

    [Theory]
    [InlineData("Refuted")]
    [InlineData("Undecided")]
    public async Task A_claim_that_is_not_upheld_is_red(string verdict)
    {
        Write("a.jsonl", Line("Coin", 1e-9, verdict));

        Assert.Equal(1, (await TestDesk.SayAsync("tally", _folder)).Exit);
    }

    [Theory]
    [InlineData("", "No claim is recorded")]
    [InlineData("{\"schema\":2}\n", "a.jsonl, line 1: schema 2 is newer")]
    [InlineData("hello\n", "a.jsonl, line 1: this is no entry of a ledger")]
    public async Task A_ledger_that_cannot_be_counted_is_named(string text, string reason) => await Refuses(text, reason);

    [Theory]
    [InlineData(0)]
    [InlineData(-1e-9)]
    [InlineData(1.5)]
    public async Task A_risk_that_is_no_probability_is_refused(double risk) => await Refuses(Line("Coin", risk), "no probability in (0, 1]");

    [Theory]
    [InlineData("--budget 0", "The budget must be a probability in (0, 1]; it is 0.")]
    [InlineData("--years 10", "--years and --runs-per-day go together")]
    [InlineData("--years 10 --runs-per-day 50 --budget 1e-6", "exclude each other")]
    [InlineData("--years -1 --runs-per-day 50", "no number of runs")]
    public async Task A_budget_that_makes_no_sense_is_refused(string options, string reason) =>
        await Refuses(Line("Coin", 1e-9), reason, options.Split(' '));

    [Fact]
    public async Task The_answer_in_words_says_who_spends_the_budget()
    {
        Write("a.jsonl", Line("[red]Coin[/]", 1e-7) + Line("Die", 1e-6));

        var (exit, output, _) = await TestDesk.SayAsync("tally", _folder);

        Assert.Equal(2, exit);
        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/tally.txt", Trimmed(output));
    }

    [Fact]
    public async Task Help_shows_an_example()
    {
        var (exit, output, _) = await TestDesk.SayAsync("tally", "--help");

        Assert.Equal(0, exit);
        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/tally-help.txt", Trimmed(output));
    }

    async Task Refuses(string text, string reason, params string[] options)
    {
        Write("a.jsonl", text);

        var (exit, output, errors) = await TestDesk.SayAsync(["tally", _folder, .. options]);

        Assert.Equal((3, ""), (exit, output));
        Assert.Contains(reason, errors, StringComparison.Ordinal);
    }

    string Write(string name, string text)
    {
        string file = Path.Combine(_folder, name);
        File.WriteAllText(file, text);
        return file;
    }

    static string Line(string test, double risk, string verdict = "Upheld") => string.Create(CultureInfo.InvariantCulture, $$"""
        {"schema":1,"run":"r","seed":"0","stream":"0","assembly":"Suite","test":"{{test}}","history":"h","claim":"c","family":"rate","tolerance":0,"defect":0.1,"risk":{{risk:R}},"confidence":0.999,"trials":1000,"cap":5000,"logEvidenceAgainstClaim":0,"verdict":"{{verdict}}","theorem":"t","seconds":0.5,"file":"f.cs","line":1,"replayable":true,"approximate":false}
        """) + "\n";

    static int Whole(JsonElement element, string name) => element.GetProperty(name).GetInt32();

    static string Trimmed(string text) => string.Join('\n', text.Split('\n').Select(line => line.TrimEnd())).TrimEnd() + "\n";
}
