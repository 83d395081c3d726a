using Assize.Bounds;
using MathNet.Numerics.Distributions;
using Poisson = MathNet.Numerics.Distributions.Poisson;

namespace Assize.Tests.Claims;

public class DistributionClaimTests
{
    static double Uniform(double x) => Math.Clamp(x, 0, 1);

    // Mass moved from above ½ to the point ½: the distance is the mass.
    static double Shifted(Random rng, double mass) => rng.NextDouble() is var place && place < 0.5 + mass && place >= 0.5 ? 0.5 : place;

    [Fact]
    public void A_right_distribution_is_upheld_and_a_wrong_one_refuted()
    {
        Assert.Equal(Outcome.Upheld, Claim.Follows(Uniform, tolerance: 0.02).Judge(rng => rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Follows(Uniform, tolerance: 0.02).Judge(rng => Math.Pow(rng.NextDouble(), 1.2)).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.Follows(new Exponential(2), 0.02).Judge(rng => -Math.Log(1 - rng.NextDouble()) / 2).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Follows(new Exponential(2), 0.02).Judge(rng => -Math.Log(1 - rng.NextDouble()) / 2.4).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.Follows(new Normal(3, 2), 0.03).Judge(rng => 3 + 2 * Normal.InvCDF(0, 1, rng.NextDouble())).Outcome);
    }

    [Fact]
    public void Ties_and_jumps_are_seen_from_both_sides()
    {
        Assert.Equal(Outcome.Upheld, Claim.Follows(new DiscreteUniform(1, 6), 0.02).Judge(rng => rng.Next(1, 7)).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.Follows(new Poisson(0.5), 0.02).Judge(rng => Counted(rng, 0.5)).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Follows(new Poisson(0.5), 0.02).Judge(rng => Counted(rng, 0.65)).Outcome);
        // A die against the line through its corners: farthest just below a face.
        Assert.Equal(Outcome.Refuted, Claim.Follows(x => Math.Clamp(x / 6, 0, 1), 0.05).Judge(rng => rng.Next(1, 7)).Outcome);
    }

    static int Counted(Random rng, double mean)
    {
        int count = 0;
        for (double time = -Math.Log(1 - rng.NextDouble()); time < mean; time -= Math.Log(1 - rng.NextDouble()))
            count++;
        return count;
    }

    // The published values of a simulation in another language, 20,000 repetitions: red at target, tolerance, mid-grey, defect
    // and twice the defect, and the mean trials. 1,500 repetitions differ from a share p by 0.08 or more with probability
    // 2·exp(-2·1500·0.08²) = 1e-8 at most (Hoeffding), 5 % of a mean is above 8 of its standard deviations (common practice).
    [Theory]
    [InlineData(0, 0, 745)]
    [InlineData(0.05, .0033, 1_661)]
    [InlineData(0.075, .5317, 3_253)]
    [InlineData(0.1, .9994, 1_327)]
    [InlineData(0.2, 1, 172)]
    public void Red_shares_and_mean_trials_are_as_simulated_elsewhere(double mass, double red, double trials)
    {
        // Half of the mass stands below ½; so much more is put there.
        var claim = Claim.Follows(Uniform, tolerance: 0.05).WithRisk(0.05).WithConfidence(0.95);
        (int reds, double all) = (0, 0);
        for (int i = 0; i < Calibrated.Repetitions; i++)
        {
            var verdict = claim.Judge(rng => (rng.NextDouble() < 0.5 + mass ? 0 : 0.5) + rng.NextDouble() / 2);
            (reds, all) = (reds + (verdict.Outcome == Outcome.Refuted ? 1 : 0), all + verdict.Trials);
        }

        Assert.InRange((double)reds / Calibrated.Repetitions, red - 0.08, red + 0.08);
        Assert.InRange(all / Calibrated.Repetitions, trials * 0.94, trials * 1.06);
    }

    [Fact]
    public void The_last_look_is_where_it_was_computed_elsewhere()
    {
        Assert.Equal(5_106, Claim.Follows(Uniform, tolerance: 0.05).WithRisk(0.05).WithConfidence(0.95).Plan().TrialCap);
        // (√ln(2/1e-9) + √ln(1/1e-3))² / (2·0.05²) = 10,530.1: the two-error plan with one look.
        Assert.Equal(10_531, Claim.Follows(Uniform, tolerance: 0, defect: 0.05).Plan().FixedTrials);
    }

    [Fact]
    public void Laws_with_and_without_jumps_keep_both_promises()
    {
        var coin = Claim.Follows(new Bernoulli(0.5), tolerance: 0.05);
        Calibrated.Keeps(coin, loose => loose.Judge(rng => rng.NextDouble() < 0.55 ? 1 : 0), isRight: true);
        Calibrated.Keeps(coin, loose => loose.Judge(rng => rng.NextDouble() < 0.6 ? 1 : 0), isRight: false);
        var waits = Claim.Follows(new Exponential(1), tolerance: 0.05);
        Calibrated.Keeps(Claim.Follows(Uniform, tolerance: 0.05), loose => loose.Judge(rng => Shifted(rng, 0.05)), isRight: true);
        Calibrated.Keeps(Claim.Follows(Uniform, tolerance: 0.05), loose => loose.Judge(rng => Shifted(rng, 0.1)), isRight: false);
        // A share of draws at 0: the distance is that share.
        Calibrated.Keeps(waits, loose => loose.Judge(rng => rng.NextDouble() < 0.05 ? 0 : -Math.Log(1 - rng.NextDouble())), isRight: true);
        Calibrated.Keeps(waits, loose => loose.Judge(rng => rng.NextDouble() < 0.1 ? 0 : -Math.Log(1 - rng.NextDouble())), isRight: false);
    }

    [Fact]
    public void The_text_says_how_far_and_where()
    {
        string text = Claim.Follows(new Exponential(2), 0.02).Judge(rng => -Math.Log(1 - rng.NextDouble()) / 3).ToString();

        Assert.Matches(@"^Claim refuted: draws follow .*Exponential.*, give or take 0\.02 of the draws up to any point \(caught from 0\.04 away\)\.", text);
        Assert.Matches(@"observed     a distance of 0\.\d+, (up to|below) 0\.\d+: 0\.\d+ of the draws, 0\.\d+ claimed", text);
        Assert.Contains("true distance", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_verdict_is_the_same_on_one_thread_and_on_two_and_for_every_block()
    {
        foreach (double mass in (double[])[0, 0.03, 0.06])
        {
            var claim = Claim.Follows(Uniform, tolerance: 0.02).InParallel(2);
            var plan = DistributionPlan.For(0.02, 0.04, claim.Risk, claim.Confidence);
            var whole = new DistributionRace(plan, Uniform, null);
            double[] draws = [.. Enumerable.Range(0, (int)plan.Looks[^1]).Select(i => Shifted(TrialRandom.At(7, i), mass))];
            whole.Add(draws);
            foreach (int block in (int[])[1, 7, 4096])
            {
                var race = new DistributionRace(plan, Uniform, null);
                foreach (double[] some in draws.Chunk(block))
                    race.Add(some);
                Assert.Equal((whole.Outcome, whole.Report().Trials, whole.Report().Observed), (race.Outcome, race.Report().Trials, race.Report().Observed));
            }
        }

        Assert.Equal(Outcome.Upheld, Claim.Follows(Uniform, tolerance: 0.02).InParallel(2).Judge(rng => rng.NextDouble()).Outcome);
    }

    [Fact]
    public void The_fixed_plan_and_caps_are_kept()
    {
        var claim = Claim.Follows(Uniform, tolerance: 0.05);
        long needed = claim.Plan().FixedTrials;

        Assert.Equal((Outcome.Upheld, needed + 5), claim.WithTrials(needed + 5).Judge(rng => rng.NextDouble()) is var verdict ? (verdict.Outcome, verdict.Trials) : default);
        Assert.Throws<ClaimRefusedException>(() => claim.WithTrials(needed - 1).Judge(rng => rng.NextDouble()));
        Assert.Equal((Outcome.Undecided, 50L), claim.WithTrialCap(50).Judge(rng => rng.NextDouble()) is var capped ? (capped.Outcome, capped.Trials) : default);
    }

    [Fact]
    public void Draws_that_are_no_numbers_refute_and_infinite_ones_count()
    {
        int trial = 0;
        Assert.Contains("trial 5 drew NaN", Claim.Follows(Uniform, 0.05).Judge(rng => ++trial == 5 ? double.NaN : rng.NextDouble()).ToString(), StringComparison.Ordinal);
        Assert.Equal(Outcome.Refuted, Claim.Follows(Uniform, 0.05).Judge(rng => rng.Next(5) == 0 ? double.PositiveInfinity : rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.Follows(Uniform, 0.05).Judge(rng => rng.Next(5) == 0 ? double.NegativeInfinity : rng.NextDouble()).Outcome);
    }

    [Fact]
    public void A_function_that_is_no_distribution_is_refused_with_the_point()
    {
        Assert.Matches("lies between 0 and 1; at [0-9.E-]+ this one is 1[.]", Refusal(() => Claim.Follows(x => 2 * x, 0.05).Judge(rng => rng.NextDouble())));
        Assert.Contains("this one is NaN", Refusal(() => Claim.Follows(x => double.NaN, 0.05).Judge(rng => rng.NextDouble())), StringComparison.Ordinal);
        Assert.Contains("never falls; this one does", Refusal(() => Claim.Follows(x => 1 - x, 0.05).Judge(rng => rng.NextDouble())), StringComparison.Ordinal);
        Assert.Contains("A tolerance of 0 needs an explicit defect", Refusal(() => Claim.Follows(Uniform, 0)), StringComparison.Ordinal);
        Assert.Contains("the tolerance must be a distance", Refusal(() => Claim.Follows(Uniform, -1)), StringComparison.OrdinalIgnoreCase);
        Assert.Contains("there is nothing to catch", Refusal(() => Claim.Follows(Uniform, 0.5, 1.5)), StringComparison.Ordinal);
        Assert.Contains("more than 100,000,000", Refusal(() => Claim.Follows(Uniform, 1e-4).Plan()), StringComparison.Ordinal);
    }

    static string Refusal(Action action) => Assert.Throws<ClaimRefusedException>(action).Message;
}
