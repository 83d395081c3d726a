using System.Numerics;

namespace Assize.Bounds.Tests.Assessment;

/// <summary>Buckets, coverage, birthdays, extremes, ranks: against every way the draws can fall.</summary>
public class CountingAssessmentsTests
{
    [Fact]
    public void Buckets_enclose_the_multinomial()
    {
        int cases = 0;
        foreach (double[] shares in (double[][])[[0.5, 0.5], [0.2, 0.3, 0.5], [0.25, 0.25, 0.25, 0.25], [0.1, 0.2, 0.3, 0.4]])
        {
            foreach (int trials in (int[])[4, 9, 16, 24])
            {
                for (int low = 0; low <= trials / 2; low += 2)
                {
                    for (int high = low + 2; high <= trials; high += 3)
                    {
                        var assessment = new BucketsAssessment(shares, trials, low, high);
                        double red = Enumerated.AnyOutside(shares, trials, low, high);
                        Enumerated.Contains(assessment.FalseFailure, red, $"{shares.Length} buckets, {trials} in {low}..{high}");
                        cases++;
                    }
                }
            }
        }

        Assert.True(cases > 250, $"{cases} cases");
        // Rare reds add up: the union is then the truth to a part in a thousand.
        var rare = new BucketsAssessment(4, 24, 0, 17);
        Assert.InRange(rare.FalseFailure.Upper / Enumerated.AnyOutside([0.25, 0.25, 0.25, 0.25], 24, 0, 17), 1, 1.001);
        Assert.InRange(rare.FalseFailure.Upper / rare.FalseFailure.Lower, 1, 1.01);
    }

    [Fact]
    public void Buckets_need_the_trials_of_their_worst_share()
    {
        var assessment = new BucketsAssessment([0.1, 0.9], 100, 5, 95);
        Assert.Equal(
            ProportionAssessment.TrialsNeeded(new ProportionBand(0.045, 0.955), 0.9, 5e-7), assessment.TrialsNeeded(1e-6));
        Assert.True(assessment.SmallestDefectCaught(0.99) is < -0.01 or > 0.01);
        Assert.ThrowsAny<ArgumentException>(() => new BucketsAssessment([], 10, 0, 5));
    }

    // Inclusion and exclusion in whole numbers: P(exactly k values) = C(m, k)·Σ(-1)^(k-j)·C(k, j)·j^n / m^n.
    [Fact]
    public void Coverage_is_that_of_inclusion_and_exclusion()
    {
        int cases = 0;
        foreach (int values in (int[])[2, 6, 10, 30])
        {
            foreach (int trials in (int[])[3, 10, 40, 150, 400])
            {
                foreach (int least in (int[])[1, 2, values / 2, values - 1, values])
                {
                    double red = Fewer(values, trials, least);
                    var assessment = new CoverageAssessment(values, trials, least);
                    Enumerated.Contains(assessment.FalseFailure, red, $"{trials} draws of {values}, {least} wanted");
                    cases++;
                }
            }
        }

        Assert.Equal(100, cases);
    }

    // Too many steps to follow: the bounds alone, still around the truth.
    [Theory]
    [InlineData(100, 1200, 100)]
    [InlineData(100, 2500, 100)]
    [InlineData(300, 1000, 280)]
    public void Coverage_beyond_exact_reach_is_enclosed(int values, int trials, int least)
    {
        var padded = new CoverageAssessment(values, trials, least);

        Enumerated.Contains(padded.FalseFailure, Fewer(values, trials, least), $"{trials} draws of {values}");
    }

    [Fact]
    public void A_coupon_collector_needs_what_the_union_says_and_no_less()
    {
        long needed = new CoverageAssessment(6, 20, 6).TrialsNeeded(1e-6)!.Value;

        Assert.True(new CoverageAssessment(6, needed, 6).FalseFailure.Upper <= 1e-6);
        Assert.True(new CoverageAssessment(6, needed - 1, 6).FalseFailure.Lower > 0.9e-6);
        Assert.Equal(-1 / 6.0, new CoverageAssessment(6, 1000, 6).SmallestDefectCaught(0.99)!.Value, 1e-4);
        Assert.Null(new CoverageAssessment(6, 100, 7).TrialsNeeded(0.1));
    }

    // 23 people and 365 days: 0.507297, the birthday problem of common knowledge; else the product in whole numbers.
    [Fact]
    public void Birthdays_are_those_of_common_knowledge()
    {
        Enumerated.Contains(new DistinctAssessment(365, 23).FalseFailure, 0.5072972343239854, "23 of 365");
        foreach (int values in (int[])[10, 365, 10_000])
        {
            foreach (int trials in (int[])[1, 2, 5, 10])
            {
                BigInteger ways = 1;
                for (int i = 0; i < trials; i++)
                    ways *= values - i;
                double repeats = (double)(BigInteger.Pow(values, trials) - ways) / (double)BigInteger.Pow(values, trials);
                Enumerated.Contains(new DistinctAssessment(values, trials).FalseFailure, repeats, $"{trials} of {values}");
            }
        }

        // Beyond the terms added up, the bounds lie close: n²/2d small.
        var wide = new DistinctAssessment(1e18, 1_000_000).FalseFailure;
        Assert.InRange(wide.Upper / wide.Lower, 1, 1 + 1e-6);
        Assert.Equal(5e-7, wide.Upper, 1e-12);
        Assert.Equal(1, new DistinctAssessment(5, 6).FalseFailure.Lower);
    }

    [Fact]
    public void Something_that_happens_once_is_a_power()
    {
        var assessment = new SomeAssessment(0.25, 20);
        Enumerated.Contains(assessment.FalseFailure, Math.Pow(0.75, 20), "0.75^20");
        Assert.Equal(49, assessment.TrialsNeeded(1e-6));
        Assert.True(Math.Pow(0.75, 49) <= 1e-6 && Math.Pow(0.75, 48) > 1e-6);
        // Green must become rare: the rate at which 20 trials have one success with probability 0.1 or less.
        Assert.Equal(1 - Math.Pow(0.9, 1 / 20.0), 0.25 + assessment.SmallestDefectCaught(0.9)!.Value, 1e-9);
        Assert.Null(new SomeAssessment(0, 5).TrialsNeeded(0.1));
    }

    [Theory]
    [InlineData(5, 4, 6)]
    [InlineData(10, 6, 6)]
    [InlineData(3, 2, 5)]
    public void Extremes_of_dice_are_powers(int trials, int low, int high)
    {
        var law = Law.WholeNumbers(1, 6);
        double UpTo(int face) => Math.Pow(face / 6.0, trials);

        Enumerated.Contains(
            new ExtremeAssessment(law, trials, greatest: true, new Band(low, high)).FalseFailure, UpTo(low - 1) + 1 - UpTo(high), "the greatest die");
        Enumerated.Contains(
            new ExtremeAssessment(law, trials, greatest: false, new Band(7 - high, 7 - low)).FalseFailure, UpTo(low - 1) + 1 - UpTo(high), "the least die");
        Enumerated.Contains(
            new ExtremeAssessment(Law.Uniform(0, 1), trials, greatest: true, new Band(0.9, null)).FalseFailure, Math.Pow(0.9, trials), "the greatest of uniform draws");
        Enumerated.Contains(
            new ExtremeAssessment(Law.Exponential(2), trials, greatest: false, new Band(null, 1)).FalseFailure, Math.Exp(-trials / 2.0), "the least of exponential draws");
    }

    // The rank-th of n dice is above a face when fewer than rank dice are not: counts of a binomial, added up.
    [Fact]
    public void Ranks_of_dice_are_counts()
    {
        int cases = 0;
        foreach (int trials in (int[])[5, 11, 40])
        {
            for (int rank = 1; rank <= trials; rank += 3)
            {
                for (int low = 1; low <= 5; low++)
                {
                    for (int high = low; high <= 6; high++)
                    {
                        double red = Counts(trials, high / 6.0, count => count < rank) + Counts(trials, (low - 1) / 6.0, count => count >= rank);
                        Enumerated.Contains(
                            new QuantileAssessment(Law.WholeNumbers(1, 6), trials, rank, new Band(low, high)).FalseFailure, red, $"rank {rank} of {trials} in {low}..{high}");
                        cases++;
                    }
                }
            }
        }

        Assert.True(cases >= 400, $"{cases} cases");
    }

    static double Counts(int trials, double rate, Func<int, bool> holds) => Enumerated.Where(Enumerated.Sum([1 - rate, rate], trials), holds);

    static double Fewer(int values, int trials, int least)
    {
        BigInteger ways = 0;
        for (int seen = 0; seen < Math.Min(least, values + 1); seen++)
        {
            BigInteger onto = 0;
            for (int j = 0; j <= seen; j++)
                onto += ((seen - j) % 2 == 0 ? 1 : -1) * Choose(seen, j) * BigInteger.Pow(j, trials);
            ways += Choose(values, seen) * onto;
        }

        var all = BigInteger.Pow(values, trials);
        return (double)((ways << 1200) / all) == double.PositiveInfinity
            ? Math.Exp(BigInteger.Log(ways) - BigInteger.Log(all))
            : (double)((ways << 200) / all) / Math.Pow(2, 200) is var share && share > 1e-40 ? share : Math.Exp(BigInteger.Log(ways) - BigInteger.Log(all));
    }

    static BigInteger Choose(int n, int k)
    {
        BigInteger ways = 1;
        for (int i = 0; i < k; i++)
            ways = ways * (n - i) / (i + 1);
        return ways;
    }
}
