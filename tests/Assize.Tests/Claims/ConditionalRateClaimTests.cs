using Assize.Bounds;

namespace Assize.Tests.Claims;

public class ConditionalRateClaimTests
{
    [Fact]
    public void Trials_that_do_not_qualify_are_passed_over_and_counted()
    {
        // A die that shows 3 or less is a 3 one time in three.
        var claim = Claim.RateWhenItQualifies(1 / 3.0, tolerance: 0.02);
        static bool? Trial(Random rng) => rng.Next(1, 7) is var face and <= 3 ? face == 3 : null;

        var verdict = claim.Judge(Trial);

        Assert.Equal(Outcome.Upheld, verdict.Outcome);
        Assert.Matches(@"passed over  [\d,]+ trials that did not qualify", verdict.ToString());
        Assert.StartsWith("Claim upheld: among trials that qualify, the rate is 0.3333333333, give or take 0.02", verdict.ToString(), StringComparison.Ordinal);
        Assert.Equal(Outcome.Refuted, claim.Judge(rng => rng.Next(1, 7) is var face and <= 4 ? face == 3 : null).Outcome);
    }

    [Fact]
    public void The_last_trial_is_counted_among_all()
    {
        int trial = 0;
        var verdict = Claim.RateWhenItQualifies(0, tolerance: 0, defect: 0.5).Judge(_ => ++trial == 10 ? true : trial % 2 == 0 ? false : null);

        Assert.Equal((Outcome.Refuted, 5L), (verdict.Outcome, verdict.Trials));
        Assert.Contains("-10-net", verdict.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void A_condition_that_hardly_ever_comes_true_is_refused() => Assert.Contains(
        "Of 1,000,001 trials only 0 qualified.",
        Assert.Throws<ClaimRefusedException>(() => Claim.RateWhenItQualifies(0.5, tolerance: 0.1).Judge(_ => null)).Message,
        StringComparison.Ordinal);

    [Fact]
    public void Both_promises_are_kept()
    {
        var claim = Claim.RateWhenItQualifies(0.5, tolerance: 0.05, defect: 0.1);
        static bool? Trial(Random rng, double rate) => rng.Next(3) == 0 ? null : rng.NextDouble() < rate;

        Calibrated.Keeps(claim, loose => loose.Judge(rng => Trial(rng, 0.55)), isRight: true);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => Trial(rng, 0.6)), isRight: false);
    }
}
