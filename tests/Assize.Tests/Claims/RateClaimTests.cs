using Assize.Bounds;

namespace Assize.Tests.Claims;

public class RateClaimTests
{
    [Fact]
    public void A_right_rate_is_upheld_and_a_wrong_one_refuted()
    {
        Assert.Equal(Outcome.Upheld, Claim.Rate(0.25, tolerance: 0.02).Judge(rng => rng.Next(4) == 0).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Rate(0.25, tolerance: 0.02).Judge(rng => rng.Next(3) == 0).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.RateAtLeast(0.9, defect: 0.05).Judge(rng => rng.NextDouble() < 0.95).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.RateAtLeast(0.9, defect: 0.05).Judge(rng => rng.NextDouble() < 0.8).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.RateAtMost(0.01, defect: 0.01).Judge(rng => rng.NextDouble() < 0.005).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.RateAtMost(0.01, defect: 0.01).Judge(rng => rng.NextDouble() < 0.05).Outcome);
    }

    [Fact]
    public void What_must_never_happen_is_refuted_by_its_first_happening()
    {
        var never = Claim.RateAtMost(0, defect: 0.001);

        Assert.Equal((Outcome.Upheld, 6905L), (never.Judge(_ => false).Outcome, never.Judge(_ => false).Trials));
        int trial = 0;
        var verdict = never.Judge(_ => ++trial == 41);
        Assert.Equal((Outcome.Refuted, 41L), (verdict.Outcome, verdict.Trials));
        Assert.Equal(double.PositiveInfinity, verdict.LogEvidenceAgainstClaim);
    }

    [Theory]
    [InlineData(double.NaN, 0.1, null, "The target must lie in [0, 1]; it is NaN.")]
    [InlineData(double.PositiveInfinity, 0.1, null, "The target must lie in [0, 1]; it is Infinity.")]
    [InlineData(-0.1, 0.1, null, "The target must lie in [0, 1]; it is -0.1.")]
    [InlineData(1.1, 0.1, null, "The target must lie in [0, 1]; it is 1.1.")]
    [InlineData(0.5, double.NaN, null, "The tolerance must be a distance of 0 or more; it is NaN.")]
    [InlineData(0.5, -0.1, null, "The tolerance must be a distance of 0 or more; it is -0.1.")]
    [InlineData(0.5, 0.0, null, "A tolerance of 0 needs an explicit defect")]
    [InlineData(0.5, 0.1, 0.1, "The defect (0.1) must be a greater distance than the tolerance (0.1)")]
    [InlineData(0.5, 0.1, double.NegativeInfinity, "The defect must be a distance above 0; it is -Infinity.")]
    [InlineData(0.5, 0.1, 0.7, "there is nothing to catch")]
    public void Numbers_that_mean_nothing_are_refused(double target, double tolerance, double? defect, string reason)
    {
        var refusal = Assert.Throws<ClaimRefusedException>(() => Claim.Rate(target, tolerance, defect));

        Assert.Contains(reason, refusal.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Terms_that_mean_nothing_are_refused()
    {
        var claim = Claim.Rate(0.5, tolerance: 0.1);

        Refused("The risk must lie between 1e-300 and 1; it is 0.", () => claim.WithRisk(0));
        Refused("The risk must lie between 1e-300 and 1; it is NaN.", () => claim.WithRisk(double.NaN));
        Refused("The confidence must lie between 0 and 1; it is 1.", () => claim.WithConfidence(1));
        Refused("WithTrials needs 1 trial or more; it is -5.", () => claim.WithTrials(-5));
        Refused("WithTrialCap needs 1 trial or more; it is 0.", () => claim.WithTrialCap(0));
        Refused("WithTimeCap needs a time above 0", () => claim.WithTimeCap(TimeSpan.Zero));
        Refused("InParallel needs a number of threads", () => claim.InParallel(-1));
        Refused("Named needs a name", () => claim.Named(" "));
        Refused("'half a key' is no replay key", () => claim.OnlyTrial("half a key"));
        Refused("must be greater than the risk", () => claim.WithRisk(0.5).WithConfidence(0.4).Plan());
    }

    static void Refused(string reason, Func<object> attempt) =>
        Assert.Contains(reason, Assert.Throws<ClaimRefusedException>(attempt).Message, StringComparison.Ordinal);

    [Fact]
    public void Too_few_trials_are_refused_before_the_first_and_the_number_needed_is_named()
    {
        var claim = Claim.Rate(0.5, tolerance: 0, defect: 0.1).WithRisk(1e-6);
        int trials = 0;

        var refusal = Assert.Throws<ClaimRefusedException>(() => claim.WithTrials(1585).Judge(_ => ++trials > 0));

        Assert.Contains("1_586", refusal.Message, StringComparison.Ordinal);
        Assert.Equal(0, trials);
        Assert.Equal(1586, claim.WithTrials(1586).Judge(rng => rng.Next(2) == 0).Trials);
    }

    [Fact]
    public void A_cap_leaves_the_claim_undecided_and_the_test_red_unless_that_is_allowed()
    {
        var capped = Claim.Rate(0.5, tolerance: 0.01).WithTrialCap(50);

        var verdict = capped.Judge(rng => rng.Next(2) == 0);

        Assert.Equal((Outcome.Undecided, 50L), (verdict.Outcome, verdict.Trials));
        Assert.Throws<ClaimRefutedException>(() => capped.MustHold(rng => rng.Next(2) == 0));
        capped.MayStayUndecided().MustHold(rng => rng.Next(2) == 0);
    }

    [Fact]
    public void A_trial_that_throws_surfaces_with_its_number_and_runs_again_alone()
    {
        var claim = Claim.Rate(0.5, tolerance: 0.01);
        bool Trial(Random rng) => rng.NextDouble() is var x && x > 0.999 ? throw new InvalidOperationException($"x was {x:R}") : x < 0.5;

        var failure = Assert.Throws<TrialFailedException>(() => claim.Judge(Trial));
        var alone = Assert.Throws<InvalidOperationException>(() => claim.OnlyTrial(failure.ReplayKey!).Judge(Trial));

        Assert.StartsWith(failure.InnerException!.Message, failure.Message, StringComparison.Ordinal);
        Assert.Contains($"trial {failure.Trial:#,0}", failure.Message, StringComparison.Ordinal);
        Assert.Contains(failure.ReplayKey!, failure.Message, StringComparison.Ordinal);
        Assert.Equal(failure.InnerException.Message, alone.Message);
    }

    [Fact]
    public void A_trial_run_alone_judges_nothing()
    {
        var verdict = Claim.Rate(0.5, tolerance: 0.05).Judge(rng => rng.Next(3) == 0);
        string key = System.Text.RegularExpressions.Regex.Match(verdict.ToString(), @"OnlyTrial\(""([^""]+)""\)").Groups[1].Value;

        var refusal = Assert.Throws<ClaimRefusedException>(() => Claim.Rate(0.5, tolerance: 0.05).OnlyTrial(key).Judge(rng => rng.Next(3) == 0));

        Assert.Contains("alone", refusal.Message, StringComparison.Ordinal);
    }
}
