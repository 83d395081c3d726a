using Assize.Bounds;

namespace Assize.Tests.Claims;

public class SpreadClaimTests
{
    // Uniform on [0, 1]: 1/√12 = 0.288675.
    [Fact]
    public void A_right_deviation_is_upheld_and_a_wrong_one_refuted()
    {
        var claim = Claim.StandardDeviation(0.2887, tolerance: 0.02).DrawsBetween(0, 1);
        Assert.Equal(Outcome.Upheld, claim.Judge(rng => rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, claim.Judge(rng => 0.1 + 0.8 * rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, claim.Judge(rng => rng.Next(2)).Outcome);

        var normal = Claim.StandardDeviation(2, tolerance: 0.1).DrawsNormal();
        Assert.Equal(Outcome.Upheld, normal.Judge(rng => 1e6 + 2 * Normal(rng)).Outcome);
        Assert.Equal(Outcome.Refuted, normal.Judge(rng => 1e6 + 2.3 * Normal(rng)).Outcome);
        Assert.Equal(Outcome.Refuted, normal.Judge(_ => 7).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.StandardDeviationAtMost(2, defect: 0.3).DrawsNormal().Judge(rng => 1.9 * Normal(rng)).Outcome);
    }

    [Fact]
    public void Both_promises_are_kept_for_draws_in_a_range()
    {
        var claim = Claim.StandardDeviation(0.2, tolerance: 0.05, defect: 0.1).DrawsBetween(0, 1);
        double Uniform(Random rng, double deviation) => 0.5 + (rng.NextDouble() - 0.5) * deviation * Math.Sqrt(12);
        double Coin(Random rng, double deviation) => rng.Next(2) == 0 ? 0.5 - deviation : 0.5 + deviation;

        foreach (var law in (Func<Random, double, double>[])[Uniform, Coin])
        {
            Calibrated.Keeps(claim, loose => loose.Judge(rng => law(rng, 0.25)), isRight: true);
            Calibrated.Keeps(claim, loose => loose.Judge(rng => law(rng, 0.15)), isRight: true);
            Calibrated.Keeps(claim, loose => loose.Judge(rng => law(rng, 0.1)), isRight: false);
        }

        Calibrated.Keeps(claim, loose => loose.Judge(rng => Coin(rng, 0.3)), isRight: false);
    }

    [Fact]
    public void Both_promises_are_kept_for_normal_draws()
    {
        var claim = Claim.StandardDeviation(1, tolerance: 0.1, defect: 0.3).DrawsNormal();

        foreach (double deviation in (double[])[1, 0.9, 1.1])
            Calibrated.Keeps(claim, loose => loose.Judge(rng => 3 + deviation * Normal(rng)), isRight: true);
        foreach (double deviation in (double[])[0.7, 1.3])
            Assert.True(Calibrated.Keeps(claim, loose => loose.Judge(rng => 3 + deviation * Normal(rng)), isRight: false).Wrong > 0);
    }

    [Fact]
    public void The_fixed_plan_runs_alone_when_asked()
    {
        var normal = Claim.StandardDeviation(1, tolerance: 0.2).DrawsNormal();
        long needed = normal.Plan().FixedTrials;
        Assert.Equal((Outcome.Upheld, needed), normal.WithTrials(needed).Judge(Normal) is var verdict ? (verdict.Outcome, verdict.Trials) : default);
        Assert.Equal(Outcome.Refuted, normal.WithTrials(needed).Judge(rng => 1.5 * Normal(rng)).Outcome);
        Assert.Throws<ClaimRefusedException>(() => normal.WithTrials(needed - 1).Judge(Normal));

        var ranged = Claim.StandardDeviation(0.2887, tolerance: 0.05).DrawsBetween(0, 1);
        Assert.Equal(Outcome.Upheld, ranged.WithTrials(ranged.Plan().FixedTrials).Judge(rng => rng.NextDouble()).Outcome);
    }

    [Fact]
    public void What_no_draws_can_do_is_refused()
    {
        Assert.Contains("have a standard deviation of 0.5 at most; claimed is 0.6.", Assert.Throws<ClaimRefusedException>(
            () => Claim.StandardDeviation(0.6, tolerance: 0.1).DrawsBetween(0, 1)).Message, StringComparison.Ordinal);
        Assert.Throws<ClaimRefusedException>(() => Claim.StandardDeviation(-1, tolerance: 0.1));
        Assert.Throws<ClaimRefusedException>(() => Claim.StandardDeviationAtMost(0, defect: 0.1).DrawsNormal());
        Assert.Throws<ClaimRefusedException>(() => default(SpreadWithoutFacts).DrawsNormal());
    }

    [Fact]
    public void A_draw_outside_its_range_or_no_number_refutes()
    {
        Assert.Contains("trial 1 drew 2, which is not between 0 and 1",
            Claim.StandardDeviation(0.2, tolerance: 0.05).DrawsBetween(0, 1).Judge(_ => 2).ToString(), StringComparison.Ordinal);
        Assert.Contains("trial 1 drew NaN, which is no number",
            Claim.StandardDeviation(0.2, tolerance: 0.05).DrawsNormal().Judge(_ => double.NaN).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void The_text_speaks_of_the_deviation()
    {
        string text = Claim.StandardDeviation(0.2887, tolerance: 0.02).DrawsBetween(0, 1).Judge(rng => 0.7 * rng.NextDouble()).ToString();

        Assert.StartsWith("Claim refuted: the standard deviation is 0.2887, give or take 0.02 (caught from 0.2487 down and from 0.3287 up), draws between 0 and 1.", text, StringComparison.Ordinal);
        Assert.Matches(@"observed     0\.(1|20|21)", text);
    }

    static double Normal(Random rng) => Math.Sqrt(-2 * Math.Log(1 - rng.NextDouble())) * Math.Cos(2 * Math.PI * rng.NextDouble());
}
