using Assize.Bounds;

namespace Assize.Tests.Claims;

public class AccuracyClaimTests
{
    [Fact]
    public void A_promise_that_is_kept_is_upheld_and_a_broken_one_refuted()
    {
        var promise = Claim.Accuracy(error: 10, probability: 0.9, defect: 0.05);

        Assert.Equal(Outcome.Upheld, promise.Judge(rng => (1000 + rng.Next(-10, 11), 1000)).Outcome);
        Assert.Equal(Outcome.Refuted, promise.Judge(rng => (1000 + rng.Next(-13, 14), 1000)).Outcome);
    }

    [Fact]
    public void It_is_the_rate_of_errors_within_the_bound()
    {
        var promise = Claim.Accuracy(error: 0.5, probability: 0.9, defect: 0.05).WithRisk(1e-6);
        var rate = Claim.RateAtLeast(0.9, defect: 0.05).WithRisk(1e-6);

        Assert.Equal(rate.Plan().FixedTrials, promise.Plan().FixedTrials);
        Assert.Equal("an estimate errs by 0.5 at most, with probability 0.9 or more (caught from 0.85 down)", promise.ToString());
    }

    [Fact]
    public void An_estimate_that_is_no_number_breaks_the_promise() => Assert.Equal(
        Outcome.Refuted, Claim.Accuracy(error: double.MaxValue, probability: 0.9, defect: 0.05).Judge(_ => (double.NaN, 1)).Outcome);

    [Theory]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void An_error_that_is_no_distance_is_refused(double error) => Assert.Contains(
        "The error promised is a distance of 0 or more",
        Assert.Throws<ClaimRefusedException>(() => Claim.Accuracy(error, 0.9, 0.05)).Message, StringComparison.Ordinal);

    [Fact]
    public void Nothing_happening_shows_that_it_is_rare()
    {
        Assert.Equal((Outcome.Upheld, 6905L), Claim.NeverAbove(0.001).Judge(_ => false) is var verdict ? (verdict.Outcome, verdict.Trials) : default);
        Assert.Equal(Outcome.Refuted, Claim.NeverAbove(0.001).Judge(rng => rng.Next(500) == 0).Outcome);
    }
}
