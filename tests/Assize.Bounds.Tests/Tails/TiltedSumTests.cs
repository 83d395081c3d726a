using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class TiltedSumTests
{
    [Fact]
    public void Enclosures_hold_the_exact_tails()
    {
        int seen = 0;
        foreach (var item in LatticeCase.Every())
        {
            var law = Law.OnPoints(item.Weights.Select((weight, value) => (weight, value)).Where(pair => pair.weight > 0)
                .ToDictionary(pair => (double)pair.value, pair => pair.weight / (double)item.Weights.Sum()));
            AssertHolds(item.Sum, Draws.Of(law, item.Trials), item.Total, item.ToString());
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
    }

    // Rates in hundredths: few of them or many of each, so that the lower end is above 0 too.
    [Fact]
    public void Sums_of_trials_with_several_rates_are_held()
    {
        int seen = 0, positive = 0;
        foreach (var (first, second, trials) in new[] { (1, 50, 30), (90, 10, 100), (30, 40, 400), (50, 51, 700) })
        {
            var sum = new ExactSum(([100 - first, first], trials), ([100 - second, second], trials));
            var draws = Draws.Of([(Law.Bernoulli(first / 100.0), trials), (Law.Bernoulli(second / 100.0), trials)]);
            for (int total = 0; total <= 2 * trials; total += 1 + trials / 200)
            {
                AssertHolds(sum, draws, total, $"{first} {second} {trials}");
                positive += TiltedSum.UpperTail(draws, total).Lower is > 0 and < 0.2 ? 1 : 0;
                seen++;
            }
        }

        Assert.True(seen > 700, $"only {seen} totals");
        Assert.True(positive > 10, $"only {positive} lower ends above 0");
    }

    static void AssertHolds(ExactSum exact, Draws draws, int total, string at)
    {
        var upper = TiltedSum.UpperTail(draws, total);
        var lower = TiltedSum.LowerTail(draws, total);
        Assert.True(exact.CompareAtLeast(total, upper.Lower) >= 0, $"{at}, {total}: the truth is below {upper}");
        Assert.True(exact.CompareAtLeast(total, upper.Upper) <= 0, $"{at}, {total}: the truth is above {upper}");
        Assert.True(exact.CompareAtMost(total, lower.Lower) >= 0, $"{at}, {total}: the truth is below {lower}");
        Assert.True(exact.CompareAtMost(total, lower.Upper) <= 0, $"{at}, {total}: the truth is above {lower}");
    }

    // A sum of n exponential draws is a gamma value; totals up to 37 deviations above the mean and as far below as goes.
    [Fact]
    public void Sums_of_exponential_draws_are_held()
    {
        int seen = 0;
        foreach (long trials in new[] { 1, 2, 5, 30, 1_000, 15_056, 1_000_000, 100_000_000 })
        {
            var draws = Draws.Of(Law.Exponential(2), trials);
            for (double spreads = -37; spreads <= 37; spreads += 0.37)
            {
                double mean = trials + spreads * Math.Sqrt(trials);
                if (mean <= 0)
                    continue;

                AssertNear(TiltedSum.UpperTail(draws, 2 * mean), IncompleteGamma.UpperTail(trials, mean), trials, spreads);
                AssertNear(TiltedSum.LowerTail(draws, 2 * mean), IncompleteGamma.LowerTail(trials, mean), trials, spreads);
                seen += 2;
            }
        }

        Assert.True(seen > 2_400, $"only {seen} tails");
    }

    static void AssertNear(Enclosure tail, double truth, long trials, double spreads)
    {
        // Above the error of the gamma tail, and of the total's own rounding.
        double slack = 1e-11 + 1e-15 * Math.Abs(spreads) * Math.Sqrt(trials);
        Assert.True(
            truth < 1e-290 || (tail.Lower <= truth * (1 + slack) && truth * (1 - slack) <= tail.Upper),
            $"{trials} draws, {spreads} deviations: {tail}, {truth:R}");
    }

    // Computed elsewhere: 1,000 trials of rate 0.9 and 1,000 of rate 0.1, 1,081 successes or more: 1.108e-9.
    [Fact]
    public void Strata_are_not_taken_for_a_mixture()
    {
        var strata = Draws.Of([(Law.Bernoulli(0.9), 1000), (Law.Bernoulli(0.1), 1000)]);
        var tail = TiltedSum.UpperTail(strata, 1081);

        Assert.Equal(1.79e-9, tail.Upper, 0.005e-9);
        Assert.Equal(0, tail.Lower);
        Assert.Equal(1.108e-9, LatticeSum.UpperTail(strata, 1081).Upper, 0.0005e-9);
        Assert.Equal(1.58e-4, BinomialTail.UpperTail(2000, 1081, 0.5).Upper, 0.005e-4);
    }

    // Computed elsewhere, the tails of the exponential by the gamma law, of the die by convolution.
    [Theory]
    [InlineData(15_056 * 1.05, 5.931e-10, 7.779e-10, 9.645e-10)]
    public void Printed_enclosures_of_an_exponential_mean_are_reproduced(
        double total, double lower, double exact, double upper)
    {
        var tail = TiltedSum.UpperTail(Draws.Of(Law.Exponential(1), 15_056), total);

        Assert.Equal(1, tail.Lower / lower, 1e-3);
        Assert.Equal(1, tail.Upper / upper, 1e-3);
        Assert.InRange(exact, tail.Lower, tail.Upper);
    }

    [Fact]
    public void A_die_is_enclosed_on_both_sides()
    {
        // |mean - 3.5| ≥ 0.05 in 43,729 throws: 8.424e-10, 9.300e-10, 9.998e-10; in 4,000 throws exactly 0.06474312.
        var many = Draws.Of(Law.WholeNumbers(1, 6), 43_729);
        double distance = 43_729 * 0.05;
        double low = Math.Floor(43_729 * 3.5 - distance), high = Math.Ceiling(43_729 * 3.5 + distance);
        var (below, above) = (TiltedSum.LowerTail(many, low), TiltedSum.UpperTail(many, high));
        Assert.InRange((below.Lower + above.Lower) / 8.424e-10, 0.97, 1.03);
        Assert.InRange((below.Upper + above.Upper) / 9.998e-10, 0.97, 1.03);
        Assert.InRange(9.300e-10, below.Lower + above.Lower, below.Upper + above.Upper);

        var few = Draws.Of(Law.WholeNumbers(1, 6), 4_000);
        Assert.Equal(0.06474312, 2 * LatticeSum.UpperTail(few, 14_200).Upper, 1e-8);
    }

    [Fact]
    public void Its_page_states_how_near_the_ends_are()
    {
        var text = new System.Text.StringBuilder(
            "| draws | number | total | at least | exact | at most |\n| --- | --: | --: | --: | --: | --: |\n");
        foreach (var (trials, mean) in new[] { (100L, 1.7), (1_000, 1.2), (15_056, 1.05), (1_000_000, 1.006) })
            Append(text, "exponential", Draws.Of(Law.Exponential(1), trials), trials * mean,
                IncompleteGamma.UpperTail(trials, trials * mean));
        foreach (var (trials, mean) in new[] { (1_000L, 3.83), (43_729, 3.55), (1_000_000, 3.511) })
        {
            var draws = Draws.Of(Law.WholeNumbers(1, 6), trials);
            double total = Math.Ceiling(trials * mean);
            Append(text, "die", draws, total, LatticeSum.UpperTail(draws, total).Upper);
        }

        foreach (var (trials, total) in new[] { (1_000L, 1_081.0), (100_000, 100_805) })
        {
            var draws = Draws.Of([(Law.Bernoulli(0.9), trials), (Law.Bernoulli(0.1), trials)]);
            Append(text, "rates 0.9 and 0.1", draws, total, LatticeSum.UpperTail(draws, total).Upper);
        }

        Repository.MustContain("src/docs/tails/TiltedSum.md", "measured", text.ToString());
    }

    static void Append(System.Text.StringBuilder text, string name, Draws draws, double total, double exact)
    {
        var tail = TiltedSum.UpperTail(draws, total);
        text.Append(CultureInfo.InvariantCulture,
            $"| {name} | {draws.Groups.Sum(group => group.Count):N0} | {total:N0} | {tail.Lower:0.000e+0} | {exact:0.000e+0} | {tail.Upper:0.000e+0} |\n");
    }

    [Fact]
    public void The_documented_nearness_holds_from_ten_thousand_draws_on()
    {
        int seen = 0;
        foreach (long trials in new[] { 10_000, 100_000, 10_000_000 })
        {
            for (double spreads = 1; spreads <= 6; spreads += 0.5)
            {
                double total = trials + spreads * Math.Sqrt(trials);
                var tail = TiltedSum.UpperTail(Draws.Of(Law.Exponential(1), trials), total);
                double truth = IncompleteGamma.UpperTail(trials, total);
                Assert.InRange(tail.Lower / truth, 0.7, 1);
                Assert.InRange(tail.Upper / truth, 1, 1.3);
                seen++;
            }
        }

        Assert.Equal(33, seen);
    }

    [Fact]
    public void Totals_at_and_beyond_the_ends_are_safe()
    {
        var dice = Draws.Of(Law.WholeNumbers(1, 6), 10);
        Assert.Equal(new Enclosure(0, 0), TiltedSum.UpperTail(dice, 60.5));
        Assert.Equal(new Enclosure(0, 0), TiltedSum.LowerTail(dice, 9.5));
        Assert.InRange(TiltedSum.UpperTail(dice, 60).Upper, Math.Pow(6, -10), 2 * Math.Pow(6, -10));
        Assert.InRange(TiltedSum.UpperTail(dice, 35).Lower, 0.1, 0.5);
        Assert.InRange(TiltedSum.UpperTail(dice, 35).Upper, 0.5, 0.95);

        var uniform = Draws.Of(Law.Uniform(0, 1), 1_000_000_000);
        Assert.Equal(0, TiltedSum.UpperTail(uniform, 6e8).Lower);
        Assert.InRange(TiltedSum.UpperTail(uniform, 6e8).Upper, double.Epsilon, 1e-300);
        Assert.InRange(TiltedSum.UpperTail(uniform, 5e8).Upper, 0.5, 0.5001);
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        var coin = Draws.Of(Law.Bernoulli(0.5), 10);
        Assert.Throws<ArgumentNullException>(() => TiltedSum.UpperTail(null!, 1));
        Assert.Throws<ArgumentNullException>(() => TiltedSum.LowerTail(null!, 1));
        Assert.Throws<ArgumentException>(() => TiltedSum.UpperTail(Draws.Of(Law.Bernoulli(1), 2), 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => TiltedSum.UpperTail(coin, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => TiltedSum.LowerTail(coin, double.PositiveInfinity));
    }
}
