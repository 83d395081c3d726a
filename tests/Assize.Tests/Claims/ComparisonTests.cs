using Assize.Bounds;

namespace Assize.Tests.Claims;

public class ComparisonTests
{
    [Fact]
    public void Equal_sources_are_upheld_and_different_ones_refuted()
    {
        Assert.Equal(Outcome.Upheld, Claim.SameRate(tolerance: 0.02).Judge(rng => rng.Next(2) == 0, rng => rng.Next(4) < 2).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.SameRate(tolerance: 0.02).Judge(rng => rng.Next(2) == 0, rng => rng.Next(5) < 2).Outcome);

        var means = Claim.SameMean(tolerance: 0.1).DrawsBetween(0, 10);
        Assert.Equal(Outcome.Upheld, means.Judge(rng => rng.Next(11), rng => 10 * rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Refuted, means.Judge(rng => rng.Next(11), rng => 9 * rng.NextDouble()).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.SameMean(tolerance: 0.1).DifferenceDeviatesAtMost(1).Judge(rng => rng.NextDouble(), rng => 1 - rng.NextDouble()).Outcome);
    }

    [Fact]
    public void Both_draw_the_same_numbers_unless_kept_apart()
    {
        int trial = 0, alike = 0;
        bool Pair(double one, double other) => one == other;
        var means = Claim.SameMean(tolerance: 0.1).DrawsBetween(0, 1);
        double last = 0;
        double Remember(Random rng) => last = rng.NextDouble();
        double Compare(Random rng)
        {
            double draw = rng.NextDouble();
            (trial, alike) = (trial + 1, alike + (Pair(last, draw) ? 1 : 0));
            return draw;
        }

        means.Judge(Remember, Compare);
        Assert.True(trial > 10);
        Assert.Equal(trial, alike);

        (trial, alike) = (0, 0);
        means.OnIndependentStreams().Judge(Remember, Compare);
        Assert.True(trial > 10);
        Assert.Equal(0, alike);
    }

    [Fact]
    public void Both_promises_are_kept()
    {
        var claim = Claim.SameRate(tolerance: 0.1, defect: 0.2).OnIndependentStreams();

        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() < 0.5, rng => rng.NextDouble() < 0.6), isRight: true);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => rng.NextDouble() < 0.5, rng => rng.NextDouble() < 0.7), isRight: false);
    }

    [Fact]
    public void A_pair_may_come_from_one_trial() => Assert.Equal(
        Outcome.Upheld, Claim.SameRate(tolerance: 0.05).Judge(rng => rng.NextDouble() is var u ? (u < 0.5, u > 0.5) : default).Outcome);

    [Fact]
    public void The_same_verdict_on_two_threads()
    {
        var claim = Claim.SameMean(tolerance: 0.05).DrawsBetween(0, 1);
        static double One(Random rng) => rng.NextDouble();
        static double Other(Random rng) => Math.Sqrt(rng.NextDouble());

        Assert.Equal(Outcome.Refuted, claim.InParallel(2).Judge(One, Other).Outcome);
    }

    [Fact]
    public void It_is_told_in_words()
    {
        Assert.Equal("the difference of the two rates is 0, give or take 0.1 (caught from -0.2 down and from 0.2 up)", Claim.SameRate(tolerance: 0.1).ToString());
        Assert.Equal("the difference of the two means is 0, give or take 0.1 (caught from -0.2 down and from 0.2 up), differences between -5 and 5",
            Claim.SameMean(tolerance: 0.1).DrawsBetween(0, 5).ToString());
        Assert.Contains("Means are compared by Claim.SameMean", Assert.Throws<ClaimRefusedException>(() => default(MeansWithoutFacts).DrawsBetween(0, 1)).Message, StringComparison.Ordinal);
    }
}
