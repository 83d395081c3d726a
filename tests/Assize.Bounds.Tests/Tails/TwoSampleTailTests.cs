using System.Globalization;
using System.Numerics;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class TwoSampleTailTests
{
    [Fact]
    public void Enclosures_hold_the_counts_of_all_paths()
    {
        int seen = 0;
        for (int first = 1; first <= 15; first++)
        {
            for (int second = 1; second <= 15; second++)
            {
                for (int lead = 1; lead <= first * second; lead++)
                {
                    double distance = lead / (double)(first * second);
                    AssertHolds(TwoSampleTail.OneSided(first, second, distance), first, second, lead, true);
                    AssertHolds(TwoSampleTail.TwoSided(first, second, distance), first, second, lead, false);
                    seen += 2;
                }
            }
        }

        Assert.Equal(28_800, seen);
    }

    static void AssertHolds(Enclosure tail, int first, int second, int lead, bool oneSided)
    {
        var (staying, all) = Paths(first, second, lead, oneSided);
        var leaving = (all - staying) << 1074;
        string at = $"{first} {second} {lead}: {(double)(all - staying) / (double)all:R} {tail}";
        Assert.True(Scaled(tail.Lower) * all <= leaving, at);
        Assert.True(Scaled(tail.Upper) * all >= leaving, at);
    }

    // Paths that stay inside, point by point in whole numbers; C(30, 15) fits a long.
    static (BigInteger Staying, BigInteger All) Paths(int first, int second, int lead, bool oneSided)
    {
        var inside = new long[second + 1];
        var all = new long[second + 1];
        for (int i = 0; i <= first; i++)
        {
            for (int j = 0; j <= second; j++)
            {
                int ahead = i * second - j * first;
                bool leaves = ahead >= lead || (!oneSided && -ahead >= lead);
                all[j] = i + j == 0 ? 1 : all[j] + (j > 0 ? all[j - 1] : 0);
                inside[j] = leaves ? 0 : i + j == 0 ? 1 : inside[j] + (j > 0 ? inside[j - 1] : 0);
            }
        }

        return (inside[second], all[second]);
    }

    static BigInteger Scaled(double probability)
    {
        int shift = 0;
        for (; Math.Floor(probability) != probability; shift++)
            probability *= 2;
        return new BigInteger(probability) << (1074 - shift);
    }

    // F. Wei and R. M. Dudley, arXiv 1107.5356: for n values in each sample P(√(n/2) D ≥ M) ≤ 2 exp(-2M²) for every M
    // exactly when n is at least 458.
    [Fact]
    public void The_one_sample_constant_serves_two_samples_from_458_values_on()
    {
        Assert.True(WorstRatio(457) > 1 + 1e-8, $"{WorstRatio(457):R}");
        Assert.True(WorstRatio(100) > 1.0017, $"{WorstRatio(100):R}");
        Assert.True(WorstRatio(20) > 1.014, $"{WorstRatio(20):R}");
        foreach (int size in new[] { 458, 459, 500, 1_000, 5_000 })
            Assert.True(WorstRatio(size) < 1, $"{size}: {WorstRatio(size):R}");
    }

    static double WorstRatio(int size) => Enumerable.Range(1, size).Max(lead =>
    {
        double bound = 2 * Math.Exp(-(double)lead * lead / size);
        double tail = TwoSampleTail.TwoSided(size, size, lead / (double)size).Upper;
        return bound > 1e-290 ? tail / bound : 0;
    });

    [Fact]
    public void Samples_of_one_size_agree_with_the_paths_far_out()
    {
        int seen = 0;
        foreach (int size in new[] { 30, 200, 457, 1_000 })
        {
            for (int lead = 1; lead <= size; lead += 1 + size / 25)
            {
                double distance = lead / (double)size;
                var even = TwoSampleTail.TwoSided(size, size, distance);
                var uneven = TwoSampleTail.TwoSided(size, size + 1, distance);
                Assert.True(uneven.Upper < 1e-290 || Math.Abs(Math.Log(even.Upper / uneven.Upper)) < 1.5, $"{size} {lead}");
                var one = TwoSampleTail.OneSided(size, size, distance);
                Assert.InRange(even.Upper, one.Lower, 2 * one.Upper);
                seen++;
            }
        }

        Assert.True(seen > 80, $"only {seen} distances");
    }

    [Fact]
    public void Beyond_the_paths_the_closed_bound_takes_over_and_covers()
    {
        foreach (var (first, second) in new[] { (2_000L, 2_001L), (100L, 50_000L), (1_000_000_000L, 999_999_999L) })
        {
            double unit = Math.Sqrt((first + second) / (double)first / second);
            for (double spreads = 1; spreads < 6; spreads += 0.5)
            {
                var two = TwoSampleTail.TwoSided(first, second, Math.Min(1, spreads * unit));
                var one = TwoSampleTail.OneSided(first, second, Math.Min(1, spreads * unit));
                // The limit law's tail is 2 exp(-2·spreads²).
                Assert.InRange(two.Upper, Math.Min(1, 1.8 * Math.Exp(-2 * spreads * spreads)), 1);
                Assert.True(one.Upper <= two.Upper && two.Lower == 0);
            }
        }

        var exact = TwoSampleTail.TwoSided(1_999, 2_000, 0.08);
        var bound = TwoSampleTail.TwoSided(2_000, 2_001, 0.08);
        Assert.InRange(exact.Upper, 0, bound.Upper);
        Assert.Equal(4 * Math.Exp(-2 * 0.0064 * 2000 / Math.Pow(1 + Math.Sqrt(2000 / 2001.0), 2)), bound.Upper, 1e-9);
    }

    [Fact]
    public void Its_page_states_what_the_sizes_cost()
    {
        var text = new System.Text.StringBuilder(
            "| first | second | distance | at least | at most | limit law |\n| --: | --: | --: | --: | --: | --: |\n");
        foreach (var (first, second, distance) in new[]
            {
                (10L, 10L, 0.7), (20, 30, 0.5), (100, 100, 0.3), (100, 120, 0.3), (1_000, 1_000, 0.1), (1_500, 2_000, 0.08),
                (1_000_000, 1_000_000, 0.003), (1_000_000, 1_000_001, 0.003),
            })
        {
            var tail = TwoSampleTail.TwoSided(first, second, distance);
            double limit = 2 * Math.Exp(-2 * distance * distance * first / (1 + first / (double)second));
            text.Append(CultureInfo.InvariantCulture,
                $"| {first:N0} | {second:N0} | {distance} | {tail.Lower:0.0000e+0} | {tail.Upper:0.0000e+0} | {limit:0.0000e+0} |\n");
        }

        Repository.MustContain("src/docs/tails/TwoSampleTail.md", "measured", text.ToString());
    }

    // Two samples of one value: either is the greater. Two of n values apart entirely: 2 / C(2n, n).
    [Fact]
    public void Ends_of_the_domain_are_known()
    {
        Assert.Equal(1, TwoSampleTail.TwoSided(1, 1, 1).Lower, 1e-10);
        Assert.Equal(0.5, TwoSampleTail.OneSided(1, 1, 1).Lower, 1e-10);
        Assert.Equal(2.0 / 184_756, TwoSampleTail.TwoSided(10, 10, 1).Upper, 1e-14);
        Assert.Equal(2.0 / 30_045_015, TwoSampleTail.TwoSided(10, 20, 1).Upper, 1e-16);
        Assert.Equal(1, TwoSampleTail.TwoSided(10, 20, 1e-300).Upper);
        Assert.InRange(TwoSampleTail.TwoSided(1_000_000_000, 1_000_000_000, 1e-9).Lower, 1 - 1e-9, 1);
        Assert.Equal(new Enclosure(0, 1e-300), TwoSampleTail.TwoSided(1_000_000_000, 1_000_000_000, 1));
        Assert.InRange(TwoSampleTail.TwoSided(500, 500, 1).Upper / 2 * 2.7028824094543655e299, 0.9, 3.8);
    }

    [Theory]
    [InlineData(0, 5, 0.5)]
    [InlineData(5, 0, 0.5)]
    [InlineData(5, 1_000_000_001, 0.5)]
    [InlineData(5, 5, 0)]
    [InlineData(5, 5, 1.1)]
    [InlineData(5, 5, double.NaN)]
    public void Arguments_outside_the_domain_are_refused(long first, long second, double distance)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => TwoSampleTail.OneSided(first, second, distance));
        Assert.Throws<ArgumentOutOfRangeException>(() => TwoSampleTail.TwoSided(first, second, distance));
    }
}
