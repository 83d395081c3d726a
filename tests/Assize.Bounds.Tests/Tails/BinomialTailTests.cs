using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class BinomialTailTests
{
    static readonly double[] Rates = [0.5, 0.3, 0.1, 0.01, 1e-4, 0.7, 0.99, 1.0 / 3, 1 - 1e-9];

    [Fact]
    public void Enclosures_hold_the_exact_tails()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 2, 3, 7, 20, 61, 150 })
        {
            foreach (double rate in Rates)
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = -1; successes <= trials + 1; successes++)
                {
                    string at = $"{trials} {successes} {rate:R}";
                    AssertHolds(
                        BinomialTail.UpperTail(trials, successes, rate), p => exact.CompareAtLeast(successes, p), at);
                    AssertHolds(
                        BinomialTail.LowerTail(trials, successes, rate), p => exact.CompareAtMost(successes, p), at);
                    seen += 2;
                }
            }
        }

        Assert.Equal(4770, seen);
    }

    [Fact]
    public void Enclosures_between_and_outside_two_limits_hold_the_exact_probability()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 5, 30 })
        {
            foreach (double rate in Rates)
            {
                var exact = new ExactBinomial(trials, rate);
                for (int low = 0; low <= trials; low++)
                {
                    for (int high = low; high <= trials; high += 3)
                    {
                        string at = $"{trials} {low} {high} {rate:R}";
                        AssertHolds(
                            BinomialTail.Between(trials, low, high, rate), p => exact.CompareBetween(low, high, p), at);
                        AssertHolds(
                            BinomialTail.Outside(trials, low, high, rate), p => exact.CompareOutside(low, high, p), at);
                        seen++;
                    }
                }
            }
        }

        Assert.Equal(1683, seen);
    }

    [Fact]
    public void Ends_are_as_near_as_documented() => Repository.MustContain(
        "src/docs/tails/BinomialTail.md", "measured", MeasuredAccuracy());

    // Against 80 digits: the worst error of both tails, in each class of trials, while the probability is above 1e-300.
    static string MeasuredAccuracy()
    {
        var text = new System.Text.StringBuilder("| trials | rows | largest relative error |\n| --- | --: | --: |\n");
        foreach (var group in ReferenceTable.Rows("binomial_tail").GroupBy(row => Class(row.Whole("n"))))
        {
            double worst = group.Max(row => Math.Max(
                Error(row, "ln_p_ge", Binomial.LogUpperTail), Error(row, "ln_p_le", Binomial.LogLowerTail)));
            Assert.True(worst < 5e-13, $"{group.Key}: {worst}");
            text.Append(CultureInfo.InvariantCulture, $"| {group.Key} | {group.Count()} | {worst:0.0e+0} |\n");
        }

        return text.ToString();
    }

    static string Class(long trials) => trials <= 1000 ? "up to 1,000" : trials <= 1_000_000 ? "up to 1e6" : "up to 1e9";

    static double Error(ReferenceTable.Row row, string column, Func<long, long, double, double> logarithm)
    {
        double truth = row.Number(column);
        double computed = logarithm(row.Whole("n"), row.Whole("k"), row.Number("p"));
        return truth < -690 || computed == truth ? 0
            : truth > -1e-3 ? Math.Abs(computed - truth) / -truth
            : Math.Abs(computed - truth);
    }

    [Fact]
    public void A_probability_too_small_for_a_double_is_still_enclosed()
    {
        var tail = BinomialTail.UpperTail(10_000, 9_000, 0.1);

        Assert.Equal(0, tail.Lower);
        Assert.InRange(tail.Upper, double.Epsilon, 1e-299);
    }

    [Fact]
    public void Limits_out_of_order_are_refused()
    {
        Assert.Equal(new Enclosure(0, 0), BinomialTail.Between(10, 5, 4, 0.3));
        Assert.Throws<ArgumentOutOfRangeException>(() => BinomialTail.Between(10, 5, 3, 0.3));
        Assert.Throws<ArgumentOutOfRangeException>(() => BinomialTail.Outside(10, 5, 3, 0.3));
        Assert.Throws<ArgumentOutOfRangeException>(() => BinomialTail.UpperTail(10, 5, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => BinomialTail.LowerTail(-1, 5, 0.3));
    }

    static void AssertHolds(Enclosure enclosure, Func<double, int> compare, string at)
    {
        Assert.True(compare(enclosure.Lower) >= 0, $"{at}: the truth is below {enclosure}");
        Assert.True(compare(enclosure.Upper) <= 0, $"{at}: the truth is above {enclosure}");
    }
}
