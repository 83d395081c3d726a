using Assize.Bounds;

namespace Assize.Tests.Claims;

public class MeanClaimTests
{
    [Fact]
    public void A_right_mean_is_upheld_and_a_wrong_one_refuted()
    {
        var die = Claim.Mean(3.5, tolerance: 0.05).DrawsBetween(1, 6);
        Assert.Equal(Outcome.Upheld, die.Judge(rng => rng.Next(1, 7)).Outcome);
        Assert.Equal(Outcome.Refuted, die.Judge(rng => rng.Next(1, 6)).Outcome);

        var least = Claim.MeanAtLeast(0.5, defect: 0.1).DrawsBetween(0, 1);
        Assert.Equal(Outcome.Upheld, least.Judge(rng => Math.Sqrt(rng.NextDouble())).Outcome);
        Assert.Equal(Outcome.Refuted, least.Judge(rng => rng.NextDouble() / 2).Outcome);

        var most = Claim.MeanAtMost(1, defect: 0.2).DrawsDeviateAtMost(1.5);
        Assert.Equal(Outcome.Upheld, most.Judge(Exponential).Outcome);
        Assert.Equal(Outcome.Refuted, most.Judge(rng => 1.4 * Exponential(rng)).Outcome);

        var normal = Claim.Mean(0, tolerance: 0, defect: 0.25).DrawsSubGaussian(1);
        Assert.Equal(Outcome.Upheld, normal.Judge(rng => Math.Sqrt(3) * (2 * rng.NextDouble() - 1)).Outcome);
        Assert.Equal(Outcome.Refuted, normal.Judge(rng => Math.Sqrt(3) * (2 * rng.NextDouble() - 1) + 0.25).Outcome);
    }

    [Fact]
    public void Draws_that_are_never_negative_need_no_upper_end()
    {
        var claim = Claim.Mean(1, tolerance: 0.1).DrawsNonNegative(secondMoment: 2.5);

        Assert.Equal(Outcome.Upheld, claim.Judge(Exponential).Outcome);
        Assert.Equal(Outcome.Refuted, claim.Judge(rng => 0.8 * Exponential(rng)).Outcome);
        Assert.Contains("trial 1 drew -1, which is not of 0 or more", claim.Judge(_ => -1).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void A_draw_outside_its_range_refutes_at_once_and_names_itself()
    {
        int trial = 0;
        var verdict = Claim.Mean(3.5, tolerance: 0.05).DrawsBetween(1, 6).Judge(rng => ++trial == 17 ? 7 : rng.Next(1, 7));

        Assert.Equal((Outcome.Refuted, 16L), (verdict.Outcome, verdict.Trials));
        Assert.Contains("fact broken  trial 17 drew 7, which is not between 1 and 6", verdict.ToString(), StringComparison.Ordinal);
        Assert.Contains("mend the code, or the fact that the claim was given", verdict.ToString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(double.NaN, "NaN")]
    [InlineData(double.PositiveInfinity, "Infinity")]
    public void A_draw_that_is_no_number_refutes_at_once(double draw, string text)
    {
        var verdict = Claim.Mean(0, tolerance: 0.1).DrawsDeviateAtMost(1).Judge(_ => draw);

        Assert.Equal(Outcome.Refuted, verdict.Outcome);
        Assert.Contains($"trial 1 drew {text}, which is no number", verdict.ToString(), StringComparison.Ordinal);
    }

    // Mean 0 and standard deviation 1.5 against a vouched 1: a mean claim that hid it would be worth nothing.
    [Fact]
    public void Draws_that_deviate_by_more_than_vouched_refute_and_say_so()
    {
        var verdict = Claim.Mean(0, tolerance: 0.05).DrawsDeviateAtMost(1).Judge(rng => rng.Next(2) == 0 ? 1.5 : -1.5);

        Assert.Equal(Outcome.Refuted, verdict.Outcome);
        Assert.Contains("the draws deviate by more than 1 (standard deviation seen: 1.", verdict.ToString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(6.0, 1.0, "the smaller one first; given were 6 and 1")]
    [InlineData(double.NaN, 1.0, "given were NaN and 1")]
    [InlineData(0.0, double.PositiveInfinity, "given were 0 and Infinity")]
    [InlineData(4.0, 6.0, "The target must lie in [4, 6]; it is 3.5.")]
    public void Ranges_that_mean_nothing_are_refused(double lower, double upper, string reason)
    {
        var claim = Claim.Mean(3.5, tolerance: 0.05);

        Assert.Contains(reason, Assert.Throws<ClaimRefusedException>(() => claim.DrawsBetween(lower, upper)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Numbers_that_mean_nothing_are_refused_before_any_fact_is_asked_for()
    {
        Refused("The target must lie in", () => Claim.Mean(double.NaN, tolerance: 1));
        Refused("A tolerance of 0 needs an explicit defect", () => Claim.Mean(1, tolerance: 0));
        Refused("The defect must be a distance above 0; it is 0.", () => Claim.MeanAtLeast(1, defect: 0));
        Refused("The standard deviation of a draw must be above 0; it is 0.", () => Claim.MeanAtMost(1, defect: 1).DrawsDeviateAtMost(0));
        Refused("The proxy of a draw must be above 0; it is NaN.", () => Claim.MeanAtMost(1, defect: 1).DrawsSubGaussian(double.NaN));
        Refused("A mean is claimed by Claim.Mean", () => default(MeanWithoutFacts).DrawsBetween(0, 1));
    }

    [Fact]
    public void Facts_add_up_and_keep_the_terms()
    {
        var claim = Claim.Mean(0.5, tolerance: 0.01).DrawsBetween(0, 1).WithRisk(1e-6).DrawsDeviateAtMost(0.05);

        Assert.Equal(1e-6, claim.Risk);
        Assert.Equal("the mean is 0.5, give or take 0.01 (caught from 0.48 down and from 0.52 up), draws between 0 and 1 "
            + "and of standard deviation up to 0.05", claim.ToString());
        Assert.True(claim.Plan().FixedTrials <= Claim.Mean(0.5, tolerance: 0.01).DrawsBetween(0, 1).WithRisk(1e-6).Plan().FixedTrials);
    }

    [Fact]
    public void The_fixed_plan_runs_alone_when_asked_and_refuses_too_few()
    {
        var claim = Claim.Mean(0.5, tolerance: 0.05).DrawsBetween(0, 1);
        long needed = claim.Plan().FixedTrials;

        Assert.Equal((Outcome.Upheld, needed), (claim.WithTrials(needed).Judge(rng => rng.NextDouble()) is var right ? right.Outcome : default, right.Trials));
        Assert.Equal(Outcome.Refuted, claim.WithTrials(needed + 100).Judge(rng => rng.NextDouble() * 0.8).Outcome);
        Assert.Contains("averages from 0.", right.ToString(), StringComparison.Ordinal);
        Refused($"takes {needed:#,0} trials", () => claim.WithTrials(needed - 1).Judge(rng => rng.NextDouble()));
    }

    [Fact]
    public void A_cap_of_the_author_leaves_it_undecided()
    {
        var verdict = Claim.Mean(0.5, tolerance: 0.001).DrawsBetween(0, 1).WithTrialCap(100).Judge(rng => rng.NextDouble());

        Assert.Equal((Outcome.Undecided, 100L), (verdict.Outcome, verdict.Trials));
    }

    // An atom of probability 1e-6 at the far end moves the mean by less than the tolerance: right code stays green.
    [Fact]
    public void A_rare_draw_at_the_edge_of_the_range_decides_nothing() =>
        Assert.Equal(Outcome.Upheld, Claim.Mean(0.01, tolerance: 0.002).DrawsBetween(0, 1).Judge(rng => rng.Next(1_000_000) == 0 ? 1 : 0.01).Outcome);

    [Fact]
    public void Every_draw_on_a_bound_is_judged()
    {
        Assert.Equal(Outcome.Refuted, Claim.Mean(0.5, tolerance: 0.1).DrawsBetween(0, 1).Judge(_ => 1).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.MeanAtLeast(0.9, defect: 0.1).DrawsBetween(0, 1).Judge(_ => 1).Outcome);
    }

    [Fact]
    public void The_text_tells_what_was_seen()
    {
        string text = Claim.Mean(3.5, tolerance: 0.05).DrawsBetween(1, 6).Named("die").Judge(rng => rng.Next(1, 6)).ToString();

        Assert.StartsWith("Claim refuted: the mean is 3.5, give or take 0.05 (caught from 3.4 down and from 3.6 up), draws between 1 and 6.", text, StringComparison.Ordinal);
        Assert.Matches(@"observed     2\.9|observed     3\.[01]", text);
        Assert.Contains("true mean    ", text, StringComparison.Ordinal);
        Assert.Contains("bets on the mean, Ville's inequality", text, StringComparison.Ordinal);
    }

    static double Exponential(Random rng) => -Math.Log(1 - rng.NextDouble());

    static void Refused(string reason, Func<object> act) =>
        Assert.Contains(reason, Assert.Throws<ClaimRefusedException>(act).Message, StringComparison.Ordinal);
}
