using System.Globalization;
using System.Numerics;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class KolmogorovTailTests
{
    // Distances in 1/256 are exact doubles, so Steck's determinant is a whole number over (256 n)^n.
    [Fact]
    public void Enclosures_hold_the_volumes_in_whole_numbers()
    {
        int seen = 0;
        for (int trials = 1; trials <= 20; trials++)
        {
            for (int part = 1; part < 256; part++)
            {
                double distance = part / 256.0;
                AssertHolds(KolmogorovTail.OneSided(trials, distance), Stays(trials, part, true), trials, part);
                AssertHolds(KolmogorovTail.TwoSided(trials, distance), Stays(trials, part, false), trials, part);
                seen += 2;
            }
        }

        Assert.Equal(10_200, seen);
    }

    // 1 - lower ≥ stays ≥ 1 - upper, all multiplied by the whole number.
    static void AssertHolds(Enclosure tail, BigInteger stays, int trials, int part)
    {
        var leaves = BigInteger.Pow(256 * trials, trials) - stays;
        Assert.True(Times(tail.Lower, trials) <= leaves << 1074, $"{trials} {part}: the truth is below {tail}");
        Assert.True(Times(tail.Upper, trials) >= leaves << 1074, $"{trials} {part}: the truth is above {tail}");
    }

    static BigInteger Times(double probability, int trials)
    {
        int shift = 0;
        for (; Math.Floor(probability) != probability; shift++)
            probability *= 2;
        return (new BigInteger(probability) << (1074 - shift)) * BigInteger.Pow(256 * trials, trials);
    }

    // G. P. Steck, Ann. Math. Statist. 42 (1971) 1–11 (from memory): n! det[(bᵢ - aⱼ)₊^(j-i+1) / (j-i+1)!] is the
    // probability of aᵢ < U₍ᵢ₎ < bᵢ for all i; expanded along its last column.
    static BigInteger Stays(int trials, int part, bool oneSided)
    {
        int whole = 256 * trials, reach = part * trials;
        var minors = new BigInteger[trials + 1];
        minors[0] = 1;
        for (int k = 1; k <= trials; k++)
        {
            int least = Math.Max(0, 256 * k - reach);
            BigInteger ways = 1;
            for (int j = k - 1; j >= 0; j--)
            {
                ways = ways * (j + 1) / (k - j);
                int greatest = oneSided ? whole : Math.Min(whole, 256 * j + reach);
                if (greatest > least)
                    minors[k] += ((k - j) % 2 == 1 ? ways : -ways) * BigInteger.Pow(greatest - least, k - j) * minors[j];
            }
        }

        return minors[trials];
    }

    [Fact]
    public void Its_page_states_how_near_four_hundred_bits_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| trials | rows | one-sided error | two-sided error |\n| --- | --: | --: | --: |\n");
        int seen = 0;
        foreach (var group in ReferenceTable.Rows("kolmogorov_exact")
            .GroupBy(row => row.Whole("n") <= 50 ? "up to 50" : "up to 1,000"))
        {
            double one = group.Max(row => Error(
                KolmogorovTail.OneSided(row.Whole("n"), row.Number("d")), row.Number("p_dplus_ge_d"), row));
            double two = group.Max(row => Error(
                KolmogorovTail.TwoSided(row.Whole("n"), row.Number("d")), row.Number("complement"), row));
            Assert.True(Math.Max(one, two) < 5e-13, $"{group.Key}: {one} {two}");
            text.Append(CultureInfo.InvariantCulture, $"| {group.Key} | {group.Count()} | {one:0.0e+0} | {two:0.0e+0} |\n");
            seen += group.Count();
        }

        Assert.Equal(55, seen);
        Repository.MustContain("src/docs/tails/KolmogorovTail.md", "measured", text.ToString());
    }

    // The ends are the computed value moved outwards by 1e-11: their middle is that value.
    static double Error(Enclosure tail, double truth, ReferenceTable.Row row)
    {
        if (truth < 1e-299 || truth == 1)
            return 0;

        Assert.True(tail.Lower <= truth && truth <= tail.Upper, $"{row}: {tail}");
        double computed = tail.Upper == 1 ? tail.Lower / (1 - 1e-11) : tail.Lower + (tail.Upper - tail.Lower) / 2;
        return ReferenceTable.RelativeError(computed, truth);
    }

    // One value: it lies at u, the sides are 1 - u and u, and the greater of them reaches d with probability 2(1 - d).
    [Theory]
    [InlineData(0.5)]
    [InlineData(0.7)]
    [InlineData(0.999)]
    public void One_value_is_known(double distance)
    {
        Assert.Equal(1 - distance, KolmogorovTail.OneSided(1, distance).Upper, 1e-10);
        Assert.Equal(2 * (1 - distance), KolmogorovTail.TwoSided(1, distance).Lower, 1e-10);
    }

    [Fact]
    public void Up_to_a_thousand_million_trials_the_closed_bounds_take_over()
    {
        foreach (long trials in new[] { 2_001L, 100_000, 10_000_001, 1_000_000_000 })
        {
            double distance = 3 / Math.Sqrt(trials);
            var (one, two) = (KolmogorovTail.OneSided(trials, distance), KolmogorovTail.TwoSided(trials, distance));
            Assert.InRange(one.Upper / Math.Exp(-18), 0.9, 1 + 1e-10);
            Assert.InRange(two.Upper / (2 * Math.Exp(-18)), 0.9, 1 + 1e-10);
            Assert.InRange(one.Lower, trials > KolmogorovTail.OneSidedTrials ? 0 : 0.9 * Math.Exp(-18), one.Upper);
            Assert.Equal(one.Lower, two.Lower);
        }
    }

    [Fact]
    public void Neighbours_of_the_limits_agree()
    {
        foreach (double distance in new[] { 0.02, 0.05, 0.1 })
        {
            double exact = KolmogorovTail.TwoSided(KolmogorovTail.TwoSidedTrials, distance).Upper;
            var beyond = KolmogorovTail.TwoSided(KolmogorovTail.TwoSidedTrials + 1, distance);
            Assert.InRange(exact, beyond.Lower, beyond.Upper * 1.03);
        }

        Assert.Equal(new Enclosure(0, 0), KolmogorovTail.OneSided(7, 1));
        Assert.Equal(new Enclosure(0, 0), KolmogorovTail.TwoSided(7, 1));
        Assert.Equal(0, KolmogorovTail.TwoSided(400, 0.9).Lower);
        Assert.InRange(KolmogorovTail.TwoSided(400, 0.9).Upper, double.Epsilon, 1e-299);
        Assert.Equal(1, KolmogorovTail.TwoSided(7, 1e-300).Upper);
    }

    [Theory]
    [InlineData(0, 0.5)]
    [InlineData(5, 0)]
    [InlineData(5, -0.1)]
    [InlineData(5, 1.1)]
    [InlineData(5, double.NaN)]
    public void Arguments_outside_the_domain_are_refused(long trials, double distance)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => KolmogorovTail.OneSided(trials, distance));
        Assert.Throws<ArgumentOutOfRangeException>(() => KolmogorovTail.TwoSided(trials, distance));
    }
}
