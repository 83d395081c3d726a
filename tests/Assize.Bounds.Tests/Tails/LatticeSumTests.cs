using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class LatticeSumTests
{
    [Fact]
    public void Enclosures_hold_the_exact_tails()
    {
        int seen = 0;
        foreach (var item in LatticeCase.Every())
        {
            var draws = Draws.Of(Of(item.Weights), item.Trials);
            AssertHolds(item.Sum, draws, item.Total, item.ToString());
            if (seen % 7 == 0)
                AssertHolds(item.Sum, draws, item.Sum.Greatest - item.Total, item.ToString());
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
    }

    [Fact]
    public void Sums_of_several_laws_are_held_at_every_total()
    {
        var random = new Random(87);
        int seen = 0;
        for (int i = 0; i < 60; i++)
        {
            (int[] Weights, int Trials)[] groups = [.. Enumerable.Range(0, 2 + i % 3).Select(_ =>
                ((int[])[random.Next(1, 50), random.Next(0, 3), random.Next(1, 50)], random.Next(1, 12)))];
            var sum = new ExactSum(groups);
            var draws = Draws.Of([.. groups.Select(group => (Of(group.Weights), (long)group.Trials))]);
            for (int total = 0; total <= sum.Greatest; total++)
            {
                AssertHolds(sum, draws, total, $"{i}");
                seen++;
            }
        }

        Assert.True(seen > 2_000, $"only {seen} totals");
    }

    static Law Of(int[] weights) => Law.OnPoints(
        weights.Select((weight, value) => (weight, value)).Where(pair => pair.weight > 0)
            .ToDictionary(pair => (double)pair.value, pair => pair.weight / (double)weights.Sum()));

    static void AssertHolds(ExactSum exact, Draws draws, int total, string at)
    {
        var upper = LatticeSum.UpperTail(draws, total);
        var lower = LatticeSum.LowerTail(draws, total);
        Assert.True(exact.CompareAtLeast(total, upper.Lower) >= 0, $"{at}, {total}: the truth is below {upper}");
        Assert.True(exact.CompareAtLeast(total, upper.Upper) <= 0, $"{at}, {total}: the truth is above {upper}");
        Assert.True(exact.CompareAtMost(total, lower.Lower) >= 0, $"{at}, {total}: the truth is below {lower}");
        Assert.True(exact.CompareAtMost(total, lower.Upper) <= 0, $"{at}, {total}: the truth is above {lower}");
    }

    [Fact]
    public void Its_page_states_how_near_the_ends_are() => Repository.MustContain(
        "src/docs/tails/LatticeSum.md", "measured", MeasuredAccuracy());

    // Against 80 digits: both tails while they are above 1e-300.
    static string MeasuredAccuracy()
    {
        var text = new System.Text.StringBuilder(
            "| draws | number | tails | error of the middle | width |\n| --- | --: | --: | --: | --: |\n");
        foreach (var group in Binomials().GroupBy(row => Class(row.Whole("n"))))
            Append(text, $"yes/no | {group.Key}", [.. group.SelectMany(row =>
                Both(Draws.Of(Law.Bernoulli(row.Number("p")), row.Whole("n")), row, "ln_p_ge", "ln_p_le"))]);
        var poisson = ReferenceTable.Rows("poisson_tail").Where(row => row.Number("lambda") <= 1e9);
        Append(text, "Poisson | 1", [.. poisson.SelectMany(row =>
            Both(Draws.Of(Law.Poisson(row.Number("lambda")), 1), row, "ln_p_ge", "ln_p_le"))]);
        return text.ToString();
    }

    static IEnumerable<ReferenceTable.Row> Binomials() => ReferenceTable.Rows("binomial_tail").Where(row =>
        row.Number("p") is > 0 and < 1 && row.Whole("n") * row.Number("p") * (1 - row.Number("p")) < 1e8);

    static string Class(long trials) => trials <= 1000 ? "up to 1,000" : trials <= 1_000_000 ? "up to 1e6" : "up to 1e9";

    static IEnumerable<(double Error, double Width)> Both(Draws draws, ReferenceTable.Row row, string upper, string lower)
    {
        long k = row.Whole("k");
        foreach (var (tail, logarithm) in new[]
            {
                (LatticeSum.UpperTail(draws, k), row.Number(upper)), (LatticeSum.LowerTail(draws, k), row.Number(lower)),
            })
        {
            double truth = Math.Exp(logarithm);
            if (logarithm < -690 || tail.Lower == tail.Upper)
                continue;

            Assert.True(
                tail.Lower <= truth * (1 + 2e-13) && truth <= tail.Upper * (1 + 2e-13), $"{row}: {tail}, {truth:R}");
            // The logarithm of a probability near 1 keeps more digits than the probability.
            double middle = tail.Lower + (tail.Upper - tail.Lower) / 2;
            yield return (Math.Abs(Math.Log(middle) - logarithm), (tail.Upper - tail.Lower) / truth);
        }
    }

    // The documented accuracy.
    static void Append(System.Text.StringBuilder text, string name, (double Error, double Width)[] errors)
    {
        var (error, width) = (errors.Max(item => item.Error), errors.Max(item => item.Width));
        bool few = name.EndsWith("1,000", StringComparison.Ordinal);
        Assert.True(error <= (few ? 6e-13 : 5e-11) && width <= (few ? 2e-11 : 2e-8), $"{name}: {error} {width}");
        text.Append(CultureInfo.InvariantCulture, $"| {name} | {errors.Length} | {error:0.0e+0} | {width:0.0e+0} |\n");
    }

    [Theory]
    [InlineData(0.1, 0, 1000, 0.1, 300)]
    [InlineData(0.25, -7.3, 40, 0.5, 25)]
    [InlineData(-3, 1e6, 200, 0.01, 9)]
    public void Scale_and_offset_change_nothing(double scale, double shift, long count, double rate, int successes)
    {
        var image = Draws.Of(Law.Bernoulli(rate).Image(scale, shift), count);
        double total = count * shift + scale * successes;
        var expected = BinomialTail.UpperTail(count, successes, rate);
        var tail = scale > 0 ? LatticeSum.UpperTail(image, total) : LatticeSum.LowerTail(image, total);

        Assert.Equal(1, tail.Lower / expected.Lower, 1e-7);
        Assert.Equal(1, tail.Upper / expected.Upper, 1e-7);
        Assert.InRange(expected.Lower, tail.Lower * (1 - 1e-11), tail.Upper);
    }

    [Fact]
    public void Totals_off_the_lattice_count_as_the_next_one()
    {
        var dice = Draws.Of(Law.WholeNumbers(1, 6), 2);

        Assert.Equal(LatticeSum.UpperTail(dice, 10), LatticeSum.UpperTail(dice, 9.5));
        Assert.Equal(LatticeSum.UpperTail(dice, 10), LatticeSum.UpperTail(dice, 10 + 1e-11));
        Assert.Equal(LatticeSum.LowerTail(dice, 9), LatticeSum.LowerTail(dice, 9.5));
        Assert.Equal(new Enclosure(1, 1), LatticeSum.UpperTail(dice, 2));
        Assert.Equal(new Enclosure(0, 0), LatticeSum.UpperTail(dice, 12.001));
        Assert.Equal(new Enclosure(0, 0), LatticeSum.LowerTail(dice, 1.999));
        Assert.Equal(1.0 / 36, LatticeSum.UpperTail(dice, 12).Upper, 1e-12);
    }

    [Fact]
    public void Only_a_common_lattice_is_served()
    {
        Assert.True(LatticeSum.Serves(Draws.Of([(Law.Bernoulli(0.5), 3), (Law.Poisson(2).Image(2, 0.5), 1)])));
        Assert.True(LatticeSum.Serves(Draws.Of([(Law.Bernoulli(0.5).Image(3, 0), 3), (Law.WholeNumbers(7, 7), 1)])));
        Assert.False(LatticeSum.Serves(Draws.Of([(Law.Bernoulli(0.5), 3), (Law.Uniform(0, 1), 1)])));
        Assert.False(LatticeSum.Serves(Draws.Of([(Law.Bernoulli(0.5), 3), (Law.Bernoulli(0.5).Image(Math.PI, 0), 1)])));
        Assert.False(LatticeSum.Serves(Draws.Of(Law.WholeNumbers(7, 7), 1)));
        Assert.Throws<ArgumentNullException>(() => LatticeSum.Serves(null!));
    }

    [Fact]
    public void What_it_cannot_invert_is_refused()
    {
        var coin = Draws.Of(Law.Bernoulli(0.5), 10);
        Assert.Throws<ArgumentNullException>(() => LatticeSum.UpperTail(null!, 1));
        Assert.Throws<ArgumentException>(() => LatticeSum.UpperTail(Draws.Of(Law.Uniform(0, 1), 2), 1));
        Assert.Throws<ArgumentException>(() => LatticeSum.LowerTail(Draws.Of(Law.Bernoulli(1), 2), 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => LatticeSum.UpperTail(coin, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => LatticeSum.LowerTail(coin, double.NegativeInfinity));
        Assert.Throws<InvalidOperationException>(
            () => LatticeSum.UpperTail(Draws.Of(Law.Bernoulli(0.5), 1L << 52), 1L << 51));
        var spread = Draws.Of([(Law.Bernoulli(0.5), 5), (Law.Bernoulli(1e-12).Image(1e8, 0), 1)]);
        Assert.Throws<InvalidOperationException>(() => LatticeSum.UpperTail(spread, 4));
    }
}
