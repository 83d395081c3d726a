using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class ZubkovSerovTests
{
    static readonly double[] Rates = [0.5, 0.3, 0.1, 0.01, 1e-4, 0.7, 0.99, 1.0 / 3, 1 - 1e-9];

    [Fact]
    public void Enclosures_hold_the_exact_tails()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 2, 3, 7, 20, 61, 150, 333 })
        {
            foreach (double rate in Rates)
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = 0; successes <= trials; successes++)
                {
                    var upper = ZubkovSerov.UpperTail(trials, successes, rate);
                    var lower = ZubkovSerov.LowerTail(trials, successes, rate);
                    string at = $"{trials} {successes} {rate:R} {upper} {lower}";
                    Assert.True(exact.CompareAtLeast(successes, upper.Lower) >= 0, at);
                    Assert.True(exact.CompareAtLeast(successes, upper.Upper) <= 0, at);
                    Assert.True(exact.CompareAtMost(successes, lower.Lower) >= 0, at);
                    Assert.True(exact.CompareAtMost(successes, lower.Upper) <= 0, at);
                    seen += 2;
                }
            }
        }

        Assert.Equal(10_530, seen);
    }

    [Fact]
    public void Enclosures_hold_tails_computed_in_eighty_digits()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("binomial_tail"))
        {
            var (n, k, p) = (row.Whole("n"), row.Whole("k"), row.Number("p"));
            AssertHolds(row, ZubkovSerov.UpperTail(n, k, p), row.Number("ln_p_ge"));
            AssertHolds(row, ZubkovSerov.LowerTail(n, k, p), row.Number("ln_p_le"));
            seen += 2;
        }

        Assert.Equal(1250, seen);
    }

    static void AssertHolds(ReferenceTable.Row row, Enclosure enclosure, double logarithm)
    {
        double truth = Math.Exp(logarithm);
        Assert.True(
            logarithm < -690 || (enclosure.Lower <= truth * (1 + 3e-13) && truth * (1 - 3e-13) <= enclosure.Upper),
            $"{row}: {enclosure}, {truth:R}");
    }

    // The rims are exact: all successes, none, and what is left without them.
    [Fact]
    public void The_rims_are_known()
    {
        var all = ZubkovSerov.UpperTail(40, 40, 0.9);
        Assert.InRange(Math.Pow(0.9, 40), all.Lower * (1 - 1e-14), ZubkovSerov.UpperTail(40, 39, 0.9).Upper);
        Assert.Equal(1, all.Lower / Math.Pow(0.9, 40), 1e-11);
        Assert.Equal(1, ZubkovSerov.LowerTail(40, 0, 0.1).Lower / Math.Pow(0.9, 40), 1e-11);
        Assert.Equal(1, ZubkovSerov.LowerTail(40, 39, 0.9).Upper / (1 - Math.Pow(0.9, 40)), 1e-11);
        Assert.Equal(new Enclosure(1, 1), ZubkovSerov.UpperTail(40, 0, 0.9));
        Assert.Equal(new Enclosure(1, 1), ZubkovSerov.LowerTail(40, 40, 0.9));
    }

    // Trials for |S/n - ½| ≥ 0.01 with probability at most the risk, both sides; every larger number works too.
    // Computed elsewhere for this bound; the exact binomial takes 16,650 … 93,401.
    [Theory]
    [InlineData(1e-2, 16_701)]
    [InlineData(1e-4, 37_902)]
    [InlineData(1e-6, 59_902)]
    [InlineData(1e-9, 93_402)]
    public void Trial_counts_computed_elsewhere_are_reproduced(double risk, long trials)
    {
        Assert.True(Both(trials) <= risk, $"{Both(trials):R}");
        Assert.Contains(Enumerable.Range(1, 200), less => Both(trials - less) > risk);
    }

    static double Both(long trials)
    {
        long high = (51 * trials + 99) / 100;
        return ZubkovSerov.UpperTail(trials, high, 0.5).Upper + ZubkovSerov.LowerTail(trials, trials - high, 0.5).Upper;
    }

    [Fact]
    public void Its_page_states_how_near_the_ends_are()
    {
        var text = new System.Text.StringBuilder(
            "| trials | rate | successes | at least | exact | at most |\n| --: | --: | --: | --: | --: | --: |\n");
        foreach (var (trials, rate, successes) in new[]
            {
                (20L, 0.5, 17L), (100, 0.5, 80), (1_000, 0.5, 548), (1_000, 0.01, 32), (10_000, 0.5, 5_300),
                (1_000_000, 0.5, 501_500), (1_000_000_000, 0.5, 500_095_000),
            })
        {
            var tail = ZubkovSerov.UpperTail(trials, successes, rate);
            double exact = BinomialTail.UpperTail(trials, successes, rate).Upper;
            text.Append(CultureInfo.InvariantCulture,
                $"| {trials:N0} | {rate} | {successes:N0} | {tail.Lower:0.0000e+0} | {exact:0.0000e+0} | {tail.Upper:0.0000e+0} |\n");
        }

        Assert.InRange(Factor(1_000, 548), 1, 1.25);
        Assert.InRange(Factor(1_000_000, 501_500), 1, 1.01);
        Repository.MustContain("src/docs/tails/ZubkovSerov.md", "measured", text.ToString());
    }

    static double Factor(long trials, long successes)
    {
        var tail = ZubkovSerov.UpperTail(trials, successes, 0.5);
        return tail.Upper / tail.Lower;
    }

    [Theory]
    [InlineData(0, 0, 0.3)]
    [InlineData(10, -1, 0.3)]
    [InlineData(10, 11, 0.3)]
    [InlineData(10, 5, 0)]
    [InlineData(10, 5, 1)]
    [InlineData(10, 5, double.NaN)]
    public void Arguments_outside_the_domain_are_refused(long trials, long successes, double rate)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => ZubkovSerov.UpperTail(trials, successes, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => ZubkovSerov.LowerTail(trials, successes, rate));
    }
}
