using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class HoeffdingTests
{
    [Fact]
    public void Both_forms_are_at_least_the_exact_tail()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 2, 5, 20, 77 })
        {
            foreach (double rate in new[] { 0.5, 0.3, 0.1, 0.01, 0.9 })
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = 0; successes <= trials; successes++)
                {
                    double level = successes / (double)trials;
                    bool above = level >= rate;
                    double bound = above
                        ? Hoeffding.UpperTail(trials, level, rate).Upper
                        : Hoeffding.LowerTail(trials, level, rate).Upper;
                    double plain = Hoeffding.Tail(trials, 1, Math.Abs(level - rate)).Upper;
                    Assert.True(
                        (above ? exact.CompareAtLeast(successes, bound) : exact.CompareAtMost(successes, bound)) <= 0);
                    Assert.True(bound <= plain * (1 + 1e-11), $"{trials} {successes} {rate}");
                    seen++;
                }
            }
        }

        Assert.Equal(550, seen);
    }

    [Fact]
    public void Exponents_agree_with_eighty_digits()
    {
        int divergences = 0, plain = 0;
        foreach (var row in ReferenceTable.Rows("tail_bounds"))
        {
            var (n, range, t) = (row.Whole("n"), row.Number("range"), row.Number("t"));
            AssertBound(row, "ln_hoeffding", Hoeffding.Tail(n, range, t));
            plain++;
            if (row.Text("kind") != "bernoulli")
                continue;

            // Here p + t is rounded; the table's is not.
            double p = row.Number("p");
            AssertBound(row, "ln_chernoff_kl", Hoeffding.UpperTail(n, p + t, p), 1e-9);
            divergences++;
        }

        Assert.Equal((126, 116), (plain, divergences));
    }

    static void AssertBound(ReferenceTable.Row row, string column, Enclosure bound, double accuracy = 1e-11)
    {
        double truth = row.Number(column);
        Assert.Equal(0, bound.Lower);
        if (truth < -690)
            Assert.True(bound.Upper <= 1e-299, $"{row}");
        else
            Assert.True(
                Math.Abs(Math.Log(bound.Upper) - truth) <= accuracy, $"{row}: {bound.Upper:R} against e^{truth:R}");
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| trials | rate | successes | exact | bound | ratio |\n| --: | --: | --: | --: | --: | --: |\n");
        foreach (var (trials, rate, successes) in new[]
            { (100, 0.5, 65), (10_000, 0.5, 5_300), (10_000, 0.01, 160), (1_000_000, 0.01, 10_600) })
        {
            double exact = BinomialTail.UpperTail(trials, successes, rate).Upper;
            double bound = Hoeffding.UpperTail(trials, successes / (double)trials, rate).Upper;
            text.Append(CultureInfo.InvariantCulture,
                $"| {trials:N0} | {rate} | {successes:N0} | {exact:0.00e+0} | {bound:0.00e+0} | {bound / exact:0.0} |\n");
        }

        Repository.MustContain("src/docs/tails/Hoeffding.md", "measured", text.ToString());
    }

    // ln(2/1e-9)/(2·0.01²) = 107,083 for both sides at 1e-9 and margin 0.01 of the range.
    [Theory]
    [InlineData(1, 0.01, 0.5e-9, 107_083)]
    [InlineData(1, 0.01, 0.5e-2, 26_492)]
    [InlineData(5, 0.05, 0.5e-9, 107_083)]
    public void Trials_needed_are_the_first_that_suffice(double range, double margin, double risk, long trials)
    {
        Assert.Equal(trials, Hoeffding.TrialsNeeded(range, margin, risk));
        Assert.True(Hoeffding.Tail(trials, range, margin).Upper <= risk);
        Assert.True(Hoeffding.Tail(trials - 1, range, margin).Upper > risk);
    }

    [Fact]
    public void The_radius_undoes_the_tail_on_the_safe_side()
    {
        foreach (double risk in new[] { 0.3, 1e-3, 1e-9, 1e-200 })
        {
            double radius = Hoeffding.Radius(1000, 2, risk);
            double tail = Hoeffding.Tail(1000, 2, radius).Upper;
            Assert.Equal(1, tail / risk, 1e-8);
            Assert.True(2 * 1000 * Math.Pow(radius / 2, 2) >= -Math.Log(risk), $"{risk}");
        }
    }

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number() =>
        Assert.Null(Hoeffding.TrialsNeeded(1, 1e-9, 1e-9));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.UpperTail(0, 0.5, 0.4));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.UpperTail(10, 0.3, 0.4));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.LowerTail(10, 0.5, 0.4));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.UpperTail(10, double.NaN, 0.4));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.Tail(10, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.Tail(10, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.Radius(10, 1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.TrialsNeeded(1, 0.1, 9e-301));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.TrialsNeeded(1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Hoeffding.TrialsNeeded(1, 0.1, 0));
    }
}
