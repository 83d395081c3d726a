namespace Assize.Tests.Claims;

public class SameDistributionClaimTests
{
    static double Shifted(Random rng, double mass) => rng.NextDouble() is var place && place < 0.5 + mass && place >= 0.5 ? 0.5 : place;

    [Fact]
    public void Sources_that_are_alike_are_upheld_and_others_refuted()
    {
        foreach (var claim in (SameDistributionClaim[])[Claim.SameDistribution(tolerance: 0.03), Claim.SameDistribution(tolerance: 0, defect: 0.05)])
        {
            Assert.Equal(Outcome.Upheld, claim.Judge(rng => rng.NextDouble(), rng => 1 - rng.NextDouble()).Outcome);
            Assert.Equal(Outcome.Refuted, claim.Judge(rng => rng.NextDouble(), rng => Math.Pow(rng.NextDouble(), 1.3)).Outcome);
            Assert.Equal(Outcome.Upheld, claim.Judge(rng => rng.Next(6), rng => rng.Next(12) / 2).Outcome);
        }
    }

    [Fact]
    public void The_sources_draw_from_streams_of_their_own()
    {
        var (one, other) = (new List<double>(), new List<double>());
        Claim.SameDistribution(tolerance: 0.1).Judge(
            rng =>
            {
                one.Add(rng.NextDouble());
                return one[^1];
            },
            rng =>
            {
                other.Add(rng.NextDouble());
                return other[^1];
            });

        Assert.True(one.Count > 100);
        Assert.Empty(one.Intersect(other));
    }

    [Theory]
    [InlineData(0.1, 0.2)]
    [InlineData(0, 0.1)]
    public void Both_promises_are_kept(double tolerance, double defect)
    {
        var claim = Claim.SameDistribution(tolerance, defect);

        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble(), rng => Shifted(rng, tolerance)), isRight: true);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() < 0.5 ? 1 : 0, rng => rng.NextDouble() < 0.5 + tolerance ? 1 : 0), isRight: true);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble(), rng => Shifted(rng, defect)), isRight: false);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() < 0.5 ? 1 : 0, rng => rng.NextDouble() < 0.5 + defect ? 1 : 0), isRight: false);
    }

    // Wei and Dudley's inequality holds from 458 draws of each source on: no look comes before.
    [Fact]
    public void No_look_comes_before_the_inequality_holds() =>
        Assert.True(Bounds.DistributionPlan.ForPair(0, 0.5, 0.05, 0.95).Looks[0] >= 458);

    [Fact]
    public void The_text_says_where_they_differ()
    {
        string text = Claim.SameDistribution(tolerance: 0.03).Judge(rng => rng.NextDouble(), rng => rng.NextDouble() * 0.8).ToString();

        Assert.StartsWith("Claim refuted: both sources have the same distribution, give or take 0.03 of the draws up to any point (caught from 0.06 away).", text, StringComparison.Ordinal);
        Assert.Matches(@"observed     a distance of 0\.\d+, up to 0\.7\d*|0\.8\d*: 0\.\d+ of the one source, 0?1?\.?\d* of the other", text);
    }

    [Fact]
    public void A_draw_that_is_no_number_refutes() => Assert.Contains(
        "trial 1 drew NaN from the other source", Claim.SameDistribution(0.1).Judge(rng => 0, rng => double.NaN).ToString(), StringComparison.Ordinal);
}
