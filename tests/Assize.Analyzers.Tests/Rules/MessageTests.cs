using System.Globalization;

namespace Assize.Analyzers.Tests;

/// <summary>The numbers in the sentences, against whole-number arithmetic that shares nothing with the core.</summary>
public class MessageTests
{
    const string Count =
        "var picker = new Picker(); int ripe = 0; for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++;";

    [Fact]
    public async Task A_flaky_assertion_is_described_in_numbers()
    {
        string message = await Verify.Message("ASZ2001", Count + "Assert.InRange(ripe / 100.0, 0.4, 0.6);");

        string runs = ExactBinomial.RunsForAtLeast(100, 40, 60, 1, 2).ToString("N0", CultureInfo.InvariantCulture);
        Assert.StartsWith(
            $"Red in at least 1 of {runs} runs on healthy code (100 trials at rate 0.5 must give 40 to 60 successes, tolerance 0.1); ",
            message,
            StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_trials_it_asks_for_are_enough_at_each_of_the_next_numbers()
    {
        string message = await Verify.Message("ASZ2001", Count + "Assert.InRange(ripe / 100.0, 0.4, 0.6);");
        int needed = int.Parse(
            message.Split("; ")[1].Split(' ')[0], NumberStyles.AllowThousands, CultureInfo.InvariantCulture);

        Assert.Contains(
            " trials with the same band of rates bring it to 1 in 1,000,000 or less", message,
            StringComparison.Ordinal);
        Assert.All(Enumerable.Range(needed, 12), trials => Assert.True(Red(trials) <= 1e-6));
        Assert.Contains(Enumerable.Range(needed - 12, 12), trials => Red(trials) > 1e-6);
        static double Red(int trials) =>
            ExactBinomial.Outside(trials, (int)Math.Ceiling(trials * 0.4), (int)Math.Floor(trials * 0.6), 1, 2);
    }

    [Fact]
    public async Task The_rate_it_catches_is_caught()
    {
        string message = await Verify.Message("ASZ2001", Count + "Assert.InRange(ripe / 100.0, 0.4, 0.6);");
        string rate = message.Split("catches a rate of ")[1].Split(' ')[0];
        int tenThousandths = (int)Math.Round(double.Parse(rate, CultureInfo.InvariantCulture) * 10_000);

        Assert.True(ExactBinomial.Outside(100, 40, 60, tenThousandths, 10_000) >= 0.999);
        Assert.True(ExactBinomial.Outside(
            100, 40, 60, tenThousandths + Math.Sign(5000 - tenThousandths) * 3, 10_000) < 0.999);
    }

    [Fact]
    public async Task Limits_come_from_the_editor_configuration()
    {
        string message = await Verify.Message(
            "ASZ2001",
            Count + "Assert.InRange(ripe / 100.0, 0.4, 0.6);",
            new Dictionary<string, string> { ["assize.risk_limit"] = "0.01", ["assize.confidence"] = "0.5" });

        Assert.Contains("bring it to 1 in 100 or less", message, StringComparison.Ordinal);
        Assert.EndsWith("with probability 0.5", message, StringComparison.Ordinal);
        await Verify.Rule(
            "ASZ2001", Count + "Assert.InRange(ripe, 40, 60);", new Dictionary<string,
            string> { ["assize.risk_limit"] = "0.04" });
    }

    [Theory]
    [InlineData("NaN")]
    [InlineData("2")]
    [InlineData("0")]
    [InlineData("-1")]
    [InlineData("often")]
    public Task A_limit_that_is_none_leaves_the_default(string limit) => Verify.Rule(
        "ASZ2001", Count + "[|Assert.InRange(ripe, 40, 60)|];", new Dictionary<string,
            string> { ["assize.risk_limit"] = limit });

    [Fact]
    public async Task Standard_errors_are_told_that_trials_do_not_help()
    {
        string message = await Verify.Message(
            "ASZ2001", Count + "double sd = Math.Sqrt(100 * .5 * .5); Assert.True(Math.Abs(ripe - 50) < 3 * sd);");

        Assert.Contains(
            "its band is made of standard errors, so more trials do not help", message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Too_few_trials_name_the_plan()
    {
        long needed = Assize.Claim.Rate(0.5, tolerance: 0.1).Plan().FixedTrials;

        Assert.Equal(
            $"100 trials cannot judge this claim with its risk and confidence; its plan takes {needed.ToString("N0", CultureInfo.InvariantCulture)}",
            await Verify.Message("ASZ1001", "var claim = Claim.Rate(0.5, tolerance: 0.1).WithTrials(100);"));
    }

    [Fact]
    public async Task An_impossible_claim_carries_the_text_of_its_refusal()
    {
        string refusal = Assert.Throws<Assize.Bounds.ClaimRefusedException>(
            () => Assize.Claim.Rate(1.5, tolerance: 0.1)).Message;

        Assert.Equal(
            "This claim will be refused: " + refusal.TrimEnd('.'),
                await Verify.Message("ASZ1002", "var claim = Claim.Rate(1.5, tolerance: 0.1);"));
    }

    [Theory]
    [InlineData(0.3, "4", "3")]
    [InlineData(0.5, "2", "2")]
    [InlineData(1, "1", "1")]
    [InlineData(3e-7, "3,333,334", "3,333,333")]
    [InlineData(3e-20, "334e17", "333e17")]
    public void Runs_are_rounded_to_the_side_that_is_true(double probability, string atLeast, string atMost)
    {
        Assert.Equal(atLeast, Numbers.RunsForAtLeast(probability));
        Assert.Equal(atMost, Numbers.RunsForAtMost(probability));
    }
}
