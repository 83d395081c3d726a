using System.Numerics;

namespace Assize.Bounds.Tests;

public class HypergeometricTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    [Fact]
    public void Tails_agree_with_eighty_digits() => Assert.Empty(ReferenceTable.Misses(
        "hypergeometric_tail", Accuracy, 165, row =>
    {
        var (population, marked) = (row.Whole("population"), row.Whole("marked"));
        var (drawn, successes) = (row.Whole("drawn"), row.Whole("k"));
        return Math.Max(
            ReferenceTable.LogError(
                Hypergeometric.LogLowerTail(population, marked, drawn, successes), row.Number("ln_p_le")),
            ReferenceTable.LogError(
                Hypergeometric.LogUpperTail(population, marked, drawn, successes), row.Number("ln_p_ge")));
    }));

    [Fact]
    public void Every_small_case_agrees_with_whole_numbers()
    {
        int seen = 0;
        for (int population = 1; population <= 14; population++)
        {
            for (int marked = 0; marked <= population; marked++)
            {
                for (int drawn = 0; drawn <= population; drawn++)
                    seen += CheckAll(population, marked, drawn);
            }
        }

        Assert.Equal(15_638, seen);
    }

    [Fact]
    public void Random_larger_cases_agree_with_whole_numbers()
    {
        var random = new Random(83);
        for (int i = 0; i < 60; i++)
        {
            int population = random.Next(15, 900);
            CheckAll(population, random.Next(0, population + 1), random.Next(0, population + 1));
        }
    }

    static int CheckAll(int population, int marked, int drawn)
    {
        BigInteger all = Choose(population, drawn), below = 0;
        for (int successes = -1; successes <= population; successes++)
        {
            var ways = Choose(marked, successes) * Choose(population - marked, drawn - successes);
            below += ways;
            AssertLog(ways, all, Hypergeometric.LogMass(population, marked, drawn, successes));
            AssertLog(below, all, Hypergeometric.LogLowerTail(population, marked, drawn, successes));
            AssertLog(all - below + ways, all, Hypergeometric.LogUpperTail(population, marked, drawn, successes));
        }

        return population + 2;
    }

    static void AssertLog(BigInteger ways, BigInteger all, double logarithm)
    {
        // Rounded once, far below the last place of a double.
        double probability = (double)((ways << 1000) / all) * Math.Pow(2, -1000);
        if (ways.IsZero)
            Assert.Equal(double.NegativeInfinity, logarithm);
        else if (probability > 1e-250)
            Assert.True(
                ReferenceTable.RelativeError(Math.Exp(logarithm), probability) < Accuracy,
                $"{logarithm:R} instead of ln {probability:R}");
        else
            Assert.Equal(1, logarithm / (BigInteger.Log(ways) - BigInteger.Log(all)), 1e-14);
    }

    static BigInteger Choose(int n, int k)
    {
        if (k < 0 || k > n)
            return 0;

        BigInteger ways = 1;
        for (int i = 0; i < k; i++)
            ways = ways * (n - i) / (i + 1);
        return ways;
    }

    [Fact]
    public void Marked_and_drawn_may_change_places()
    {
        var random = new Random(73);
        for (int i = 0; i < 1000; i++)
        {
            long population = random.NextInt64(1, 2_000_000_000);
            long marked = random.NextInt64(0, population + 1);
            long drawn = random.NextInt64(0, Math.Min(population, 10_000) + 1);
            long successes = (long)((double)marked * drawn / population) + random.Next(-30, 31);
            double one = Hypergeometric.LogUpperTail(population, marked, drawn, successes);
            double other = Hypergeometric.LogUpperTail(population, drawn, marked, successes);
            Assert.True(ReferenceTable.LogError(one, other) <= 2 * Accuracy,
                $"{population} {marked} {drawn} {successes}: {one:R} {other:R}");
        }
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (var (population, marked, drawn, name) in new[]
        {
            (0L, 0L, 0L, "population"), (2_000_000_001, 1, 1, "population"), (long.MaxValue, 1, 1, "population"),
            (10, -1, 1, "marked"), (10, 11, 1, "marked"), (10, 1, -1, "drawn"), (10, 1, 11, "drawn"),
                (10, 1, long.MinValue, "drawn"),
        })
        {
            Assert.Throws<ArgumentOutOfRangeException>(
                name, () => Hypergeometric.LogMass(population, marked, drawn, 1));
            Assert.Throws<ArgumentOutOfRangeException>(
                name, () => Hypergeometric.LogUpperTail(population, marked, drawn, 1));
            Assert.Throws<ArgumentOutOfRangeException>(
                name, () => Hypergeometric.LogLowerTail(population, marked, drawn, 1));
        }

        foreach (long successes in new[] { long.MinValue, long.MaxValue })
        {
            Assert.Equal(double.NegativeInfinity, Hypergeometric.LogMass(10, 5, 3, successes));
            Assert.Equal(successes < 0 ? 0 : double.NegativeInfinity, Hypergeometric.LogUpperTail(10, 5, 3, successes));
            Assert.Equal(successes > 0 ? 0 : double.NegativeInfinity, Hypergeometric.LogLowerTail(10, 5, 3, successes));
        }
    }
}
