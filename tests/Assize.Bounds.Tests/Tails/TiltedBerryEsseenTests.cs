using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class TiltedBerryEsseenTests
{
    [Fact]
    public void Enclosures_hold_the_exact_tails()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 2, 7, 40, 300 })
        {
            foreach (double rate in new[] { 0.5, 0.3, 0.1, 0.01, 0.9, 0.999 })
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = 0; successes <= trials; successes += 1 + trials / 60)
                {
                    var upper = TiltedBerryEsseen.UpperTail(trials, successes, rate);
                    var lower = TiltedBerryEsseen.LowerTail(trials, successes, rate);
                    string at = $"{trials} {successes} {rate} {upper} {lower}";
                    Assert.True(exact.CompareAtLeast(successes, upper.Lower) >= 0, at);
                    Assert.True(exact.CompareAtLeast(successes, upper.Upper) <= 0, at);
                    Assert.True(exact.CompareAtMost(successes, lower.Lower) >= 0, at);
                    Assert.True(exact.CompareAtMost(successes, lower.Upper) <= 0, at);
                    seen += 2;
                }
            }
        }

        Assert.Equal(1260, seen);
    }

    [Fact]
    public void Enclosures_hold_tails_computed_in_eighty_digits()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("binomial_tail"))
        {
            var (n, k, p) = (row.Whole("n"), row.Whole("k"), row.Number("p"));
            AssertHolds(row, TiltedBerryEsseen.UpperTail(n, k, p), row.Number("ln_p_ge"));
            AssertHolds(row, TiltedBerryEsseen.LowerTail(n, k, p), row.Number("ln_p_le"));
            seen += 2;
        }

        Assert.Equal(1250, seen);
    }

    static void AssertHolds(ReferenceTable.Row row, Enclosure enclosure, double logarithm)
    {
        if (logarithm < -690)
            return;

        double truth = Math.Exp(logarithm);
        Assert.True(
            enclosure.Lower <= truth * (1 + 1e-12) && truth <= enclosure.Upper * (1 + 1e-12),
            $"{row}: {enclosure}, {truth:R}");
    }

    [Fact]
    public void Its_page_states_how_near_the_ends_are()
    {
        var text = new System.Text.StringBuilder(
            "| trials | rate | successes | at least | exact | at most |\n| --: | --: | --: | --: | --: | --: |\n");
        foreach (var (trials, rate, successes) in new[]
            {
                (100, 0.5, 80), (1_000, 0.01, 32), (10_000, 0.5, 5_300), (100_000, 0.3, 30_900),
                (1_000_000, 0.01, 10_600), (1_000_000_000, 0.5, 500_095_000),
            })
        {
            var tail = TiltedBerryEsseen.UpperTail(trials, successes, rate);
            double exact = BinomialTail.UpperTail(trials, successes, rate).Upper;
            text.Append(CultureInfo.InvariantCulture,
                $"| {trials:N0} | {rate} | {successes:N0} | {tail.Lower:0.000e+0} | {exact:0.000e+0} | {tail.Upper:0.000e+0} |\n");
        }

        Repository.MustContain("src/docs/tails/TiltedBerryEsseen.md", "measured", text.ToString());
    }

    [Fact]
    public void The_documented_nearness_holds_from_ten_thousand_trials_on()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("binomial_tail"))
        {
            var (n, k, p) = (row.Whole("n"), row.Whole("k"), row.Number("p"));
            double truth = Math.Exp(row.Number("ln_p_ge"));
            double spread = n * p * (1 - p);
            if (n < 10_000 || spread < 2_000 || truth > 0.01 || truth < 1e-12)
                continue;

            var tail = TiltedBerryEsseen.UpperTail(n, k, p);
            Assert.InRange(tail.Lower / truth, 0.75, 1);
            Assert.InRange(tail.Upper / truth, 1, 1.25);
            seen++;
        }

        Assert.True(seen >= 10, $"only {seen} rows");
    }

    [Fact]
    public void Ends_of_the_count_are_exact()
    {
        Assert.Equal(new Enclosure(1, 1), TiltedBerryEsseen.UpperTail(10, 0, 0.3));
        Assert.Equal(new Enclosure(1, 1), TiltedBerryEsseen.LowerTail(10, 10, 0.3));
        Assert.Equal(Math.Pow(0.3, 10), TiltedBerryEsseen.UpperTail(10, 10, 0.3).Upper, 1e-16);
        Assert.Equal(Math.Pow(0.7, 10), TiltedBerryEsseen.LowerTail(10, 0, 0.3).Lower, 1e-12);
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
        Assert.Throws<ArgumentOutOfRangeException>(() => TiltedBerryEsseen.UpperTail(trials, successes, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => TiltedBerryEsseen.LowerTail(trials, successes, rate));
    }
}
