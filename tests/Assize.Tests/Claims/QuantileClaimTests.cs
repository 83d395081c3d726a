using Assize.Bounds;

namespace Assize.Tests.Claims;

public class QuantileClaimTests
{
    [Fact]
    public void A_right_quantile_is_upheld_and_a_wrong_one_refuted()
    {
        Assert.Equal(Outcome.Upheld, Claim.Quantile(0.9, value: 0.9, tolerance: 0.01).Judge(rng => rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Quantile(0.9, value: 0.92, tolerance: 0.005).Judge(rng => rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Quantile(0.9, value: 0.88, tolerance: 0.005).Judge(rng => rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.Median(3, tolerance: 0.02).Judge(rng => Math.Exp(2 * rng.NextDouble() - 1) * 3).Outcome);
    }

    // A die: P(x < 3) = 1/3 and P(x ≤ 3) = 1/2, so 3 is every quantile between them and no other.
    [Theory]
    [InlineData(0.4, Outcome.Upheld)]
    [InlineData(0.34, Outcome.Upheld)]
    [InlineData(0.5, Outcome.Upheld)]
    [InlineData(0.55, Outcome.Refuted)]
    [InlineData(0.28, Outcome.Refuted)]
    public void Ties_count_on_either_side(double probability, Outcome outcome) =>
        Assert.Equal(outcome, Claim.Quantile(probability, value: 3, tolerance: 0.02, defect: 0.04).Judge(rng => rng.Next(1, 7)).Outcome);

    [Fact]
    public void Both_promises_are_kept_at_the_edges()
    {
        var claim = Claim.Quantile(0.3, value: 0.3, tolerance: 0.05, defect: 0.1);
        foreach (double shift in (double[])[0, 0.05, -0.05])
            Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() + shift), isRight: true);
        foreach (double shift in (double[])[0.1, -0.1])
            Assert.True(Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() + shift), isRight: false).Wrong > 0);
        // With ties: the atom at the quantile is wide, and its rim is exactly at the tolerance.
        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() < 0.35 ? 0.2 : 0.3), isRight: true);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() < 0.4 ? 0.2 : 0.3), isRight: false);
    }

    // A one-sided count decides each side, in whole numbers the same as the exact binomial plan of half the risk.
    [Fact]
    public void The_plan_is_that_of_two_rates_at_half_the_risk()
    {
        var plan = Claim.Quantile(0.5, value: 0, tolerance: 0.01).Plan();
        var side = RatePlan.For(Edges.Between(Domain.Rate, 0.5, null, null, 0.51, 0.52), 5e-10, 0.999);

        Assert.Equal((side.Trials, side.FirstTrials), (plan.FixedTrials, plan.FirstTrials));
    }

    [Fact]
    public void A_side_without_a_defect_asks_for_nothing()
    {
        Assert.Equal(Outcome.Upheld, Claim.Quantile(0.99, value: 1, tolerance: 0.005, defect: 0.02).Judge(rng => rng.NextDouble() * 1.005).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Quantile(0.99, value: 1, tolerance: 0.005, defect: 0.02).Judge(rng => rng.NextDouble() * 1.05).Outcome);
    }

    [Fact]
    public void The_fixed_plan_runs_alone_when_asked()
    {
        var claim = Claim.Median(0.5, tolerance: 0.05);
        long needed = claim.Plan().FixedTrials;

        Assert.Equal((Outcome.Upheld, needed), claim.WithTrials(needed).Judge(rng => rng.NextDouble()) is var verdict ? (verdict.Outcome, verdict.Trials) : default);
        Assert.Throws<ClaimRefusedException>(() => claim.WithTrials(needed - 1).Judge(rng => rng.NextDouble()));
    }

    [Fact]
    public void A_draw_that_is_no_number_refutes()
    {
        int trial = 0;
        string text = Claim.Median(0.5, tolerance: 0.05).Judge(rng => ++trial == 5 ? double.NaN : rng.NextDouble()).ToString();

        Assert.Contains("trial 5 drew NaN", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_text_shows_both_counts_when_there_are_ties()
    {
        string text = Claim.Quantile(0.55, value: 3, tolerance: 0.01).Judge(rng => rng.Next(1, 7)).ToString();

        Assert.StartsWith("Claim refuted: the 0.55 quantile is 3, give or take 0.01 of the draws (caught from 0.53 down and from 0.57 up).", text, StringComparison.Ordinal);
        Assert.Matches(@"observed     0\.[45]\d* \([\d,]+ of [\d,]+\) up to 3, 0\.3\d* \([\d,]+ of [\d,]+\) below it", text);
    }

    [Theory]
    [InlineData(0.0, 1.0, "The probability of a quantile lies between 0 and 1; it is 0.")]
    [InlineData(double.NaN, 1.0, "it is NaN")]
    [InlineData(0.5, double.PositiveInfinity, "The value of a quantile is a finite number; it is Infinity.")]
    public void Numbers_that_mean_nothing_are_refused(double probability, double value, string reason) => Assert.Contains(
        reason, Assert.Throws<ClaimRefusedException>(() => Claim.Quantile(probability, value, tolerance: 0.01)).Message, StringComparison.Ordinal);

    [Fact]
    public void A_tolerance_of_0_needs_a_defect() => Assert.Contains(
        "A tolerance of 0 needs an explicit defect", Assert.Throws<ClaimRefusedException>(() => Claim.Median(0, tolerance: 0)).Message, StringComparison.Ordinal);
}
