using System.Text.Json;

namespace Assize.Cli.Tests.Commands;

public class PlanMeanPageTests
{
    // Catoni's closed form, ⌈2(2σ²/d² + 1)(ln(2/α) + ln(1/β))⌉ for σ = 1, d = 0.05, recomputed by hand; of the risk a
    // twentieth watches the deviation.
    [Fact]
    public async Task Bounded_deviation_takes_Catonis_number()
    {
        var (exit, output, errors) = await TestDesk.SayAsync(
            "plan", "mean", "--target", "0", "--tolerance", "0", "--defect", "0.05", "--deviation", "1", "--risk", "1e-6", "--json");

        Assert.Equal((0, ""), (exit, errors));
        using var plan = JsonDocument.Parse(output);
        double expected = Math.Ceiling(2 * (2 / 0.0025 + 1) * (Math.Log(2 / 0.95e-6) + Math.Log(1000)));
        Assert.Equal(expected, plan.RootElement.GetProperty("fixed").GetProperty("trials").GetInt64(), 1.0);
        Assert.Equal("Catoni", plan.RootElement.GetProperty("fixed").GetProperty("theorem").GetString());
    }

    [Theory]
    [InlineData("--target 0 --tolerance 1", "Nothing is said about a draw")]
    [InlineData("--target 0 --tolerance 1 --from 0", "--to is missing.")]
    [InlineData("--target 0 --tolerance 0 --deviation 1", "A tolerance of 0 needs an explicit defect")]
    [InlineData("--target 9 --tolerance 1 --from 1 --to 6", "The target must lie in [1, 6]; it is 9.")]
    [InlineData("--tolerance 1 --deviation 1", "--target is missing.")]
    public async Task What_cannot_be_planned_is_said_with_its_cure(string line, string reason)
    {
        var (exit, output, errors) = await TestDesk.SayAsync(["plan", "mean", .. line.Split(' ')]);

        Assert.Equal((3, ""), (exit, output));
        Assert.Contains(reason, errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_answer_in_words_goes_theorem_by_theorem()
    {
        var (exit, output, _) = await TestDesk.SayAsync(
            "plan", "mean", "--target", "3.5", "--tolerance", "0.05", "--from", "1", "--to", "6", "--deviation", "1.8");

        Assert.Equal(0, exit);
        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/plan-mean.txt", Trimmed(output));
    }

    [Fact]
    public async Task Help_shows_an_example()
    {
        var (_, output, _) = await TestDesk.SayAsync("plan", "mean", "--help");

        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/plan-mean-help.txt", Trimmed(output));
    }

    internal static string Trimmed(string text) => string.Join('\n', text.Split('\n').Select(line => line.TrimEnd())).TrimEnd() + "\n";
}
