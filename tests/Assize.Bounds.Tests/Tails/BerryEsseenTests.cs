using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class BerryEsseenTests
{
    [Fact]
    public void The_distance_agrees_with_eighty_digits_and_covers_the_true_one()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("berry_esseen").Where(row => row.Text("dist") == "bernoulli"))
        {
            double distance = BerryEsseen.Distance(Law.Bernoulli(row.Number("p")), row.Whole("n"));
            Assert.Equal(1, distance / Math.Min(1, row.Number("bound")), 1e-9);
            Assert.True(distance >= row.Number("true_sup_distance"), $"{row}: {distance:R}");
            seen++;
        }

        Assert.Equal(28, seen);
    }

    // C. Hipp and L. Mattner (2007): for a fair coin the true distance is C(n, n/2) / 2^(n+1) for even n.
    [Theory]
    [InlineData(2, 0.25)]
    [InlineData(10, 0.123046875)]
    public void A_fair_coin_is_covered(long trials, double printed) =>
        Assert.InRange(BerryEsseen.Distance(Law.Bernoulli(0.5), trials), printed, 1.4 * printed);

    [Fact]
    public void Enclosures_hold_the_exact_tails()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 10, 100, 400 })
        {
            foreach (double rate in new[] { 0.5, 0.3, 0.1, 0.01, 0.9 })
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = 0; successes <= trials; successes += 1 + trials / 50)
                {
                    var upper = BerryEsseen.UpperTail(Law.Bernoulli(rate), trials, successes);
                    var lower = BerryEsseen.LowerTail(Law.Bernoulli(rate), trials, successes);
                    Assert.True(exact.CompareAtLeast(successes, upper.Lower) >= 0);
                    Assert.True(exact.CompareAtLeast(successes, upper.Upper) <= 0);
                    Assert.True(exact.CompareAtMost(successes, lower.Lower) >= 0);
                    Assert.True(exact.CompareAtMost(successes, lower.Upper) <= 0);
                    seen += 2;
                }
            }
        }

        Assert.Equal(920, seen);
    }

    // Two rates in hundredths, each for so many trials, against whole-number convolutions.
    [Fact]
    public void Sums_of_draws_of_several_laws_are_held()
    {
        int seen = 0;
        foreach (var (first, second) in new[] { (1, 50), (90, 10), (30, 40), (50, 51), (2, 98) })
        {
            foreach (int trials in new[] { 1, 5, 40, 300 })
            {
                var exact = new ExactSum(([100 - first, first], trials), ([100 - second, second], trials));
                var draws = Draws.Of([(Law.Bernoulli(first / 100.0), trials), (Law.Bernoulli(second / 100.0), trials)]);
                double distance = BerryEsseen.Distance(draws);
                double moments = trials * (Third(first) + Third(second)), variance = trials * (Spread(first) + Spread(second));
                Assert.Equal(1, distance / Math.Min(1, 0.5606 * moments / Math.Pow(variance, 1.5)), 1e-9);
                for (int total = 0; total <= 2 * trials; total += 1 + trials / 30)
                {
                    var (upper, lower) = (BerryEsseen.UpperTail(draws, total), BerryEsseen.LowerTail(draws, total));
                    Assert.True(exact.CompareAtLeast(total, upper.Lower) >= 0, $"{first} {second} {total}: {upper}");
                    Assert.True(exact.CompareAtLeast(total, upper.Upper) <= 0, $"{first} {second} {total}: {upper}");
                    Assert.True(exact.CompareAtMost(total, lower.Lower) >= 0, $"{first} {second} {total}: {lower}");
                    Assert.True(exact.CompareAtMost(total, lower.Upper) <= 0, $"{first} {second} {total}: {lower}");
                    seen += 2;
                }
            }
        }

        Assert.True(seen > 800, $"only {seen} tails");
    }

    static double Spread(int hundredths) => hundredths / 100.0 * (1 - hundredths / 100.0);

    static double Third(int hundredths) => Spread(hundredths) * (1 - 2 * Spread(hundredths));

    [Fact]
    public void Draws_of_one_law_keep_the_better_constant()
    {
        var law = Law.Bernoulli(0.3);

        Assert.Equal(BerryEsseen.Distance(law, 500), BerryEsseen.Distance(Draws.Of(law, 500)));
        var (one, same) = (BerryEsseen.UpperTail(law, 500, 170), BerryEsseen.UpperTail(Draws.Of(law, 500), 170));
        Assert.Equal(one.Upper, same.Upper, 1e-14);
        Assert.Equal(one.Lower, same.Lower, 1e-14);
        Assert.Throws<ArgumentNullException>(() => BerryEsseen.Distance(null!));
        Assert.Throws<ArgumentException>(() => BerryEsseen.UpperTail(Draws.Of(Law.Bernoulli(1), 5), 3));
        Assert.Throws<ArgumentOutOfRangeException>(() => BerryEsseen.LowerTail(Draws.Of(law, 5), double.NaN));
    }

    [Fact]
    public void It_proves_a_common_failure_from_below()
    {
        // 2.5 deviations of 10,000,000 fair tosses: red in 1.24 % of runs, two-sided.
        var tail = BerryEsseen.UpperTail(Law.Bernoulli(0.5), 10_000_000, 5_003_953);

        Assert.InRange(tail.Lower, 0.006, 0.0062);
        Assert.InRange(tail.Upper, 0.0062, 0.0065);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_true_distance_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| rate | trials | true distance | bound | ratio |\n| --: | --: | --: | --: | --: |\n");
        var rows = ReferenceTable.Rows("berry_esseen").Where(row => row.Text("dist") == "bernoulli");
        foreach (var row in rows.Where(row => row.Number("p") <= 0.5))
        {
            double truth = row.Number("true_sup_distance");
            double bound = BerryEsseen.Distance(Law.Bernoulli(row.Number("p")), row.Whole("n"));
            text.Append(CultureInfo.InvariantCulture,
                $"| {row.Text("p")} | {row.Whole("n"):N0} | {truth:0.00000} | {bound:0.00000} | {bound / truth:0.00} |\n");
        }

        Repository.MustContain("src/docs/tails/BerryEsseen.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        var law = Law.Bernoulli(0.3);
        Assert.Throws<ArgumentNullException>(() => BerryEsseen.Distance(null!, 5));
        Assert.Throws<ArgumentException>(() => BerryEsseen.Distance(Law.Bernoulli(0), 5));
        Assert.Throws<ArgumentException>(() => BerryEsseen.UpperTail(Law.Bernoulli(1), 5, 3));
        Assert.Throws<ArgumentOutOfRangeException>(() => BerryEsseen.Distance(law, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => BerryEsseen.UpperTail(law, 0, 3));
        Assert.Throws<ArgumentOutOfRangeException>(() => BerryEsseen.UpperTail(law, 5, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => BerryEsseen.LowerTail(law, 5, double.PositiveInfinity));
    }
}
