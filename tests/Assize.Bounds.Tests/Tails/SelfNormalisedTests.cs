using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class SelfNormalisedTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    // Given their sizes, symmetric values differ by fair signs alone: every pattern of signs is counted.
    [Fact]
    public void It_is_at_least_the_share_of_sign_patterns_that_reach_the_ratio()
    {
        var random = new Random(47);
        int seen = 0;
        double least = double.MaxValue;
        for (int i = 0; i < 84; i++)
        {
            double[] sizes =
                [.. Enumerable.Range(0, 1 + i % 12).Select(_ => i < 24 ? 1 : Math.Pow(8, random.NextDouble()))];
            foreach (var (ratio, share) in Ratios(sizes))
            {
                double tail = SelfNormalised.Tail(ratio * (1 - 1e-14)).Upper;
                Assert.True(share <= tail, $"{string.Join(' ', sizes)}: {share} at {ratio:R} against {tail}");
                least = Math.Min(least, tail / share);
                seen++;
            }
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1 + Accuracy);
    }

    static IEnumerable<(double Ratio, double Share)> Ratios(double[] sizes)
    {
        double root = Math.Sqrt(sizes.Sum(size => size * size));
        int patterns = 1 << sizes.Length;
        double[] ratios = [.. Enumerable.Range(0, patterns)
            .Select(pattern => sizes.Select((size, i) => (pattern >> i & 1) == 1 ? size : -size).Sum() / root)
            .OrderDescending()];

        // Equal sums of different rounding are one: the last of them has the whole share.
        for (int i = 0; i < patterns && ratios[i] > 0; i++)
        {
            if (i + 1 == patterns || ratios[i] - ratios[i + 1] > 1e-12)
                yield return (ratios[i], (i + 1.0) / patterns);
        }
    }

    // x with 3.178656·Q(x) at half the risk; computed elsewhere to four places.
    [Theory]
    [InlineData(1e-9, 6.2914)]
    [InlineData(1e-6, 5.1145)]
    [InlineData(1e-2, 2.9531)]
    public void Radii_agree_with_those_computed_elsewhere(double risk, double ratio) =>
        Assert.Equal(ratio, SelfNormalised.Radius(risk / 2), 0.00005);

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("SelfNormalised", Accuracy);

        // ln(1/(4 P(Z > √2))) at 40 digits (mpmath 1.3.0).
        var rows = ReferenceTable.Rows("normal_tail").Where(row => row.Number("z") >= 0);
        table.Tails("normal tails in 80 digits", rows.Select(row => (
            row.Number("ln_phibar") + 1.156458329373303,
            SelfNormalised.Tail(row.Number("z")))));
        table.MustStand();
    }

    [Fact]
    public void The_radius_undoes_the_tail()
    {
        int seen = 0;
        for (double risk = 0.99; risk >= 1e-300; risk /= 7)
        {
            double radius = SelfNormalised.Radius(risk);
            Assert.InRange(radius, 0.48, 37.2);
            Assert.InRange(SelfNormalised.Tail(radius).Upper / risk, 1 - 3e-9, 1 + Accuracy);
            seen++;
        }

        Assert.Equal(355, seen);
    }

    [Fact]
    public void Far_out_and_at_the_centre_it_stays_a_probability()
    {
        Assert.Equal((0, 1), (SelfNormalised.Tail(0).Lower, SelfNormalised.Tail(0).Upper));
        Assert.Equal((1e-300, 1e-300), (SelfNormalised.Tail(50).Upper, SelfNormalised.Tail(double.MaxValue).Upper));
    }

    [Fact]
    public void Its_page_states_the_ratios_it_takes()
    {
        var text = new System.Text.StringBuilder("| risk | ratio | normal law | Hoeffding |\n");
        text.Append("| --: | --: | --: | --: |\n");
        foreach (double risk in new[] { 1e-2, 1e-4, 1e-6, 1e-9 })
        {
            var (normal, hoeffding) = (NormalTail.UpperQuantile(risk), Math.Sqrt(-2 * Math.Log(risk)));
            text.Append(CultureInfo.InvariantCulture, $"| {risk:0e+0} | {SelfNormalised.Radius(risk):0.0000} ");
            text.Append(CultureInfo.InvariantCulture, $"| {normal:0.0000} | {hoeffding:0.0000} |\n");
        }

        Repository.MustContain("src/docs/tails/SelfNormalised.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Tail(-1e-9));
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Tail(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Tail(double.PositiveInfinity));
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Radius(0));
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Radius(9e-301));
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Radius(1));
        Assert.Throws<ArgumentOutOfRangeException>(() => SelfNormalised.Radius(double.NaN));
    }
}
