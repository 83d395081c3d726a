using System.Text.Json;
using Assize.Bounds.Tests;

namespace Assize.Cli.Tests.Commands;

public class PlanRatePageTests
{
    [Fact]
    public async Task A_fair_coin_takes_1586_trials()
    {
        var (exit, output, errors) = await TestDesk.SayAsync(
            "plan", "rate", "--target", "0.5", "--tolerance", "0", "--defect", "0.1", "--risk", "1e-6", "--confidence", "0.999", "--json");

        Assert.Equal((0, ""), (exit, errors));
        using var plan = JsonDocument.Parse(output);
        Assert.Equal(1586, plan.RootElement.GetProperty("fixed").GetProperty("trials").GetInt64());
        Assert.Equal(1573, plan.RootElement.GetProperty("fixed").GetProperty("firstTrials").GetInt64());
    }

    [Fact]
    public async Task The_answer_in_JSON_has_the_shape_that_is_promised()
    {
        var (_, output, _) = await TestDesk.SayAsync("plan", "rate", "--target", "0.5", "--tolerance", "0.1", "--json");

        using var plan = JsonDocument.Parse(output);
        Assert.Equal(
            "fixed(trials,firstTrials,acceptLow,acceptHigh,theorem,falseFailure(lower,upper),missedDefect(lower,upper)),"
            + "sequential(cap,expectedTrials(atTarget,atTolerance,atDefect)),theorems[(name,trials,assumes)]",
            Shape(plan.RootElement));
    }

    // The table was searched exhaustively in 113-bit arithmetic, see its first lines.
    [Fact]
    public async Task Every_plan_of_the_exhaustive_search_is_given()
    {
        var seen = new Dictionary<string, int>();
        foreach (var row in ReferenceTable.Rows("fixed_plan_binomial"))
        {
            string kind = row.Text("kind");
            if (kind == "two_sided" && (row.Decimal("p0") < row.Decimal("tol") || row.Decimal("p0") + row.Decimal("tol") > 1))
                continue;

            string[] side = kind switch
            {
                "at_least" => ["--at-least", row.Text("p0")],
                "at_most" => ["--at-most", row.Text("p0")],
                _ => ["--target", row.Text("p0"), "--tolerance", "0"],
            };
            var (exit, output, errors) = await TestDesk.SayAsync([
                "plan", "rate", .. side, "--defect", row.Text("tol"), "--risk", row.Text("alpha"),
                "--confidence", Numbers.Text((double)(1 - row.Decimal("beta"))), "--json"]);

            Assert.True(exit == 0, $"{row}: {errors}");
            using var plan = JsonDocument.Parse(output);
            var fixedPlan = plan.RootElement.GetProperty("fixed");
            Assert.Equal(
                (row.ToString(), row.Whole("n_first"), row.Whole("n_all")),
                (row.ToString(), fixedPlan.GetProperty("firstTrials").GetInt64(), fixedPlan.GetProperty("trials").GetInt64()));
            seen[kind] = seen.GetValueOrDefault(kind) + 1;
        }

        Assert.Equal((63, 63, 7, 56), (seen["at_least"], seen["at_most"], seen["two_sided_drop"], seen["two_sided"]));
    }

    [Theory]
    [InlineData("--target 2 --tolerance 0.1", "The target must lie in [0, 1]; it is 2.")]
    [InlineData("--target NaN --tolerance 0.1", "The target must lie in [0, 1]; it is NaN.")]
    [InlineData("--target 0.5 --tolerance 0", "A tolerance of 0 needs an explicit defect")]
    [InlineData("--target 0.5 --tolerance 0.2 --defect 0.1", "The defect (0.1) must be a greater distance than the tolerance (0.2)")]
    [InlineData("--target 0.5 --tolerance 0.2 --defect 0.9", "lie outside [0, 1]: there is nothing to catch")]
    [InlineData("--target 0.5", "--tolerance is missing.")]
    [InlineData("--at-least 0.9", "--defect is missing.")]
    [InlineData("--at-least 0.9 --at-most 0.9 --defect 0.1", "exclude each other")]
    [InlineData("--at-least 0.9 --defect 0.1 --tolerance 0.1", "A one-sided claim has no tolerance")]
    [InlineData("--target 0.5 --tolerance 0.1 --risk 0", "The risk must lie between 1e-300 and 1; it is 0.")]
    [InlineData("--target 0.5 --tolerance 0.1 --confidence 1", "The confidence must lie between 0 and 1; it is 1.")]
    [InlineData("--target half --tolerance 0.1", "'half' is not a number.")]
    public async Task What_cannot_be_planned_is_said_with_its_cure(string line, string reason)
    {
        var (exit, output, errors) = await TestDesk.SayAsync(["plan", "rate", .. line.Split(' ')]);

        Assert.Equal((3, ""), (exit, output));
        Assert.Contains(reason, errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_answer_in_words_names_both_ways_and_every_theorem()
    {
        var (exit, output, _) = await TestDesk.SayAsync(
            "plan", "rate", "--target", "0.5", "--tolerance", "0", "--defect", "0.1", "--risk", "1e-6");

        Assert.Equal(0, exit);
        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/plan-rate.txt", Trimmed(output));
    }

    [Fact]
    public async Task Help_shows_an_example()
    {
        var (exit, output, _) = await TestDesk.SayAsync("plan", "rate", "--help");

        Assert.Equal(0, exit);
        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/plan-rate-help.txt", Trimmed(output));
    }

    static string Trimmed(string text) => string.Join('\n', text.Split('\n').Select(line => line.TrimEnd())).TrimEnd() + "\n";

    static string Shape(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => string.Join(',', element.EnumerateObject().Select(property => property.Name + Inside(property.Value))),
        _ => "",
    };

    static string Inside(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => $"({Shape(element)})",
        JsonValueKind.Array => $"[({Shape(element[0])})]",
        _ => "",
    };
}
