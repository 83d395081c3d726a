using System.Globalization;
using System.Numerics;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class PoissonBinomialTests
{
    // Rates in 1/1024 are exact doubles: every probability is a whole number over a power of two.
    [Fact]
    public void Enclosures_hold_the_whole_numbers()
    {
        var random = new Random(91);
        int seen = 0;
        for (int i = 0; i < 300; i++)
        {
            int spread = (i % 3) switch { 0 => 3, 1 => 40, _ => 1024 };
            int[] parts = [.. Enumerable.Range(0, 1 + i % 40).Select(_ => random.Next(spread + 1))
                .Select(part => i % 2 == 0 ? part : 1024 - part)];
            double[] rates = [.. parts.Select(part => part / 1024.0)];
            var exact = AtLeast(parts);
            for (int successes = 0; successes <= parts.Length + 1; successes++)
            {
                AssertHolds(PoissonBinomial.UpperTail(rates, successes), exact[successes], parts.Length);
                AssertHolds(PoissonBinomial.LowerTail(rates, successes - 1), exact[0] - exact[successes], parts.Length);
                seen += 2;
            }
        }

        Assert.True(seen > 12_000, $"only {seen} tails");
    }

    static BigInteger[] AtLeast(int[] parts)
    {
        var ways = new BigInteger[parts.Length + 2];
        ways[0] = 1;
        for (int trial = 0; trial < parts.Length; trial++)
        {
            for (int count = trial + 1; count >= 0; count--)
                ways[count] = ways[count] * (1024 - parts[trial]) + (count > 0 ? ways[count - 1] * parts[trial] : 0);
        }

        for (int count = parts.Length; count >= 0; count--)
            ways[count] += ways[count + 1];
        return ways;
    }

    static void AssertHolds(Enclosure tail, BigInteger ways, int trials)
    {
        var truth = ways << 1074;
        Assert.True(Scaled(tail.Lower) << (10 * trials) <= truth, $"{trials}: the truth is below {tail}");
        Assert.True(Scaled(tail.Upper) << (10 * trials) >= truth, $"{trials}: the truth is above {tail}");
    }

    static BigInteger Scaled(double probability)
    {
        int shift = 0;
        for (; Math.Floor(probability) != probability; shift++)
            probability *= 2;
        return new BigInteger(probability) << (1074 - shift);
    }

    [Fact]
    public void Its_page_states_how_near_eighty_digits_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| trials | tails | largest relative error | ends apart |\n| --- | --: | --: | --: |\n");
        foreach (var group in ReferenceTable.Rows("binomial_tail").Where(row => row.Whole("n") <= 1_000)
            .GroupBy(row => row.Whole("n") <= 100 ? "up to 100" : "up to 1,000"))
        {
            var errors = group.SelectMany(Errors).ToArray();
            Assert.True(errors.Max() < 5e-13, $"{group.Key}: {errors.Max()}");
            text.Append(CultureInfo.InvariantCulture,
                $"| {group.Key} | {errors.Length} | {errors.Max():0.0e+0} | {2 * (4 * group.Max(row => row.Whole("n")) + 10) * 1.2e-16:0.0e+0} |\n");
        }

        Repository.MustContain("src/docs/tails/PoissonBinomial.md", "measured", text.ToString());
    }

    static IEnumerable<double> Errors(ReferenceTable.Row row)
    {
        double[] rates = [.. Enumerable.Repeat(row.Number("p"), (int)row.Whole("n"))];
        foreach (var (tail, logarithm) in new[]
            {
                (PoissonBinomial.UpperTail(rates, row.Whole("k")), row.Number("ln_p_ge")),
                (PoissonBinomial.LowerTail(rates, row.Whole("k")), row.Number("ln_p_le")),
            })
        {
            double truth = Math.Exp(logarithm);
            if (logarithm < -690)
                continue;

            Assert.True(tail.Lower <= truth * (1 + 3e-13) && truth * (1 - 3e-13) <= tail.Upper, $"{row}: {tail}");
            yield return tail.Upper == 1 ? 0 : Math.Abs(Math.Log((tail.Lower + tail.Upper) / 2) - logarithm);
        }
    }

    // Records among n values come at place i with probability 1/i, independently: the number of permutations of 10
    // with 3 records is the Stirling number 1,172,700 of 10! = 3,628,800.
    [Fact]
    public void Records_of_a_permutation_are_counted()
    {
        double[] rates = [.. Enumerable.Range(1, 10).Select(place => 1.0 / place)];
        double three = PoissonBinomial.UpperTail(rates, 3).Upper - PoissonBinomial.UpperTail(rates, 4).Upper;

        Assert.Equal(1_172_700 / 3_628_800.0, three, 1e-12);
        Assert.Equal(1 / 3_628_800.0, PoissonBinomial.UpperTail(rates, 10).Lower, 1e-18);
    }

    [Fact]
    public void Beyond_the_exact_trials_it_agrees_with_itself()
    {
        double[] few = [.. Enumerable.Range(0, 20_000).Select(i => i % 2 == 0 ? 0.9 : 0.1)];
        double[] more = [.. few, 0];
        double[] many = [.. Enumerable.Range(0, 30_000).Select(i => 0.25 + i / 60_000.0)];
        foreach (long successes in new[] { 9_800L, 10_250 })
        {
            var exact = PoissonBinomial.UpperTail(few, successes);
            var inverted = PoissonBinomial.UpperTail(more, successes);
            Assert.Equal(1, inverted.Upper / exact.Upper, 1e-9);
            Assert.True(inverted.Lower <= exact.Upper && exact.Lower <= inverted.Upper);
            var below = PoissonBinomial.LowerTail(few, successes);
            var invertedBelow = PoissonBinomial.LowerTail(more, successes);
            Assert.True(invertedBelow.Lower <= below.Upper && below.Lower <= invertedBelow.Upper);
        }

        var tilted = PoissonBinomial.UpperTail(many, 15_400);
        Assert.InRange(tilted.Upper / tilted.Lower, 1, 3);
        Assert.InRange(PoissonBinomial.UpperTail(many, 15_000).Upper, 0.5, 0.51);
    }

    [Fact]
    public void Far_tails_and_certain_trials_are_safe()
    {
        Assert.Equal(1, PoissonBinomial.UpperTail([1e-30, 1e-29, 1e-28], 3).Upper / 1e-87, 1e-13);
        Assert.Equal(1, PoissonBinomial.UpperTail([.. Enumerable.Repeat(1e-29, 10)], 10).Lower / 1e-290, 1e-13);
        Assert.Equal(new Enclosure(0, 1e-300), PoissonBinomial.UpperTail([.. Enumerable.Repeat(1e-31, 10)], 10));
        Assert.Equal(new Enclosure(1, 1), PoissonBinomial.UpperTail([0.5], 0));
        Assert.Equal(new Enclosure(0, 0), PoissonBinomial.UpperTail([0.5], 2));
        Assert.Equal(new Enclosure(0, 0), PoissonBinomial.LowerTail([0.5], -1));
        Assert.Equal(1, PoissonBinomial.UpperTail([1, 1, 0], 2).Upper);
        Assert.InRange(PoissonBinomial.UpperTail([1, 1, 0], 3).Upper, 0, 1e-300);
        double[] certain = [.. Enumerable.Range(0, 20_001).Select(i => (double)(i % 2))];
        Assert.Equal(new Enclosure(1, 1), PoissonBinomial.UpperTail(certain, 10_000));
        Assert.Equal(new Enclosure(0, 0), PoissonBinomial.UpperTail(certain, 10_001));
        Assert.Equal(new Enclosure(1, 1), PoissonBinomial.LowerTail(certain, 10_000));
        Assert.Equal(new Enclosure(0, 0), PoissonBinomial.LowerTail(certain, 9_999));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentException>(() => PoissonBinomial.UpperTail([], 1));
        Assert.Throws<ArgumentException>(() => PoissonBinomial.LowerTail(null!, 1));
        foreach (double rate in new[] { -0.1, 1.1, double.NaN })
            Assert.Throws<ArgumentOutOfRangeException>(() => PoissonBinomial.UpperTail([0.5, rate], 1));
    }
}
