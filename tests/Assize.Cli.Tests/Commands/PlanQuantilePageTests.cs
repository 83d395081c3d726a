using System.Text.Json;

namespace Assize.Cli.Tests.Commands;

public class PlanQuantilePageTests
{
    [Fact]
    public async Task A_quantile_takes_the_trials_of_a_rate_at_half_the_risk()
    {
        var (exit, output, errors) = await TestDesk.SayAsync("plan", "quantile", "--probability", "0.5", "--tolerance", "0", "--defect", "0.1", "--json");
        var (_, side, _) = await TestDesk.SayAsync("plan", "rate", "--at-most", "0.5", "--defect", "0.1", "--risk", "5e-10", "--json");

        Assert.Equal((0, ""), (exit, errors));
        using var plan = JsonDocument.Parse(output);
        using var rate = JsonDocument.Parse(side);
        Assert.Equal(
            rate.RootElement.GetProperty("fixed").GetProperty("trials").GetInt64(),
            plan.RootElement.GetProperty("fixed").GetProperty("trials").GetInt64());
    }

    [Theory]
    [InlineData("--tolerance 0.1", "--probability is missing.")]
    [InlineData("--probability 1 --tolerance 0.1", "The probability of a quantile lies between 0 and 1; it is 1.")]
    public async Task What_cannot_be_planned_is_said_with_its_cure(string line, string reason)
    {
        var (exit, _, errors) = await TestDesk.SayAsync(["plan", "quantile", .. line.Split(' ')]);

        Assert.Equal(3, exit);
        Assert.Contains(reason, errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Help_shows_an_example()
    {
        var (_, output, _) = await TestDesk.SayAsync("plan", "quantile", "--help");

        Testing.Repository.MustEqual("tests/Assize.Cli.Tests/Commands/plan-quantile-help.txt", PlanMeanPageTests.Trimmed(output));
    }
}
