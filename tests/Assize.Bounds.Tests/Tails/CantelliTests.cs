using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class CantelliTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void Both_forms_are_at_least_the_exact_tails_and_two_values_reach_the_first()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var item in LatticeCase.Every())
        {
            double one = Cantelli.Tail(item.Trials, item.Variance, item.Margin).Upper;
            item.AssertCovered(one);
            item.AssertBothSidesCovered(Cantelli.EitherTail(item.Trials, item.Variance, item.Margin).Upper);
            least = Math.Min(least, one / item.Probability);
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1 + Accuracy);
    }

    // Weights w, u, w on three points: a single draw is at either end with probability 2w/(2w + u), its variance.
    [Fact]
    public void Three_points_reach_the_two_sided_form()
    {
        int seen = 0;
        for (int end = 1; end <= 20; end++)
        {
            for (int middle = 0; middle <= 20; middle++)
            {
                double variance = 2.0 * end / (2 * end + middle);
                Assert.InRange(Cantelli.EitherTail(1, variance, 1).Upper, variance, variance * (1 + Accuracy));
                seen++;
            }
        }

        Assert.Equal(420, seen);
    }

    [Fact]
    public void A_mean_of_exponential_draws_is_covered()
    {
        int seen = 0;
        foreach (long trials in new[] { 1, 2, 10, 1_000, 1_000_000 })
        {
            for (double spreads = 0.1; spreads < 30; spreads *= 1.3)
            {
                double margin = spreads / Math.Sqrt(trials);
                double above = IncompleteGamma.UpperTail(trials, trials * (1 + margin));
                double below = margin < 1 ? IncompleteGamma.LowerTail(trials, trials * (1 - margin)) : 0;
                Assert.True(above <= Cantelli.Tail(trials, 1, margin).Upper);
                Assert.True(below <= Cantelli.Tail(trials, 1, margin).Upper);
                Assert.True(above + below <= Cantelli.EitherTail(trials, 1, margin).Upper);
                seen++;
            }
        }

        Assert.Equal(110, seen);
    }

    // Yes/no draws of rate 1/2, margin 0.01, and of an exponential law, margin 0.05; computed elsewhere. At 1e-6 and
    // below rounding up costs a trial in 1e12.
    [Theory]
    [InlineData(0.25, 0.01, 1e-2, 250_000)]
    [InlineData(0.25, 0.01, 1e-4, 25_000_000)]
    [InlineData(0.25, 0.01, 1e-6, 2_500_000_000)]
    [InlineData(0.0099, 0.005, 1e-2, 39_600)]
    [InlineData(0.0099, 0.005, 1e-4, 3_960_000)]
    [InlineData(0.0099, 0.005, 1e-6, 396_000_000)]
    [InlineData(1, 0.05, 1e-2, 40_000)]
    [InlineData(1, 0.05, 1e-4, 4_000_000)]
    public void Trials_needed_for_both_sides_are_the_first_that_suffice(
        double variance, double margin, double risk, long trials)
    {
        long needed = Cantelli.EitherTrialsNeeded(variance, margin, risk)!.Value;

        Assert.InRange(needed, trials, trials + 1);
        Assert.True(Cantelli.EitherTail(needed, variance, margin).Upper <= risk);
        Assert.True(Cantelli.EitherTail(needed - 1, variance, margin).Upper > risk);
    }

    [Theory]
    [InlineData(1, 0.05, 1e-3)]
    [InlineData(0.25, 0.01, 0.9)]
    [InlineData(1e-6, 1, 1e-9)]
    public void Trials_needed_for_one_side_are_the_first_that_suffice(double variance, double margin, double risk)
    {
        long needed = Cantelli.TrialsNeeded(variance, margin, risk)!.Value;

        Assert.True(Cantelli.Tail(needed, variance, margin).Upper <= risk);
        Assert.True(needed == 1 || Cantelli.Tail(needed - 1, variance, margin).Upper > risk);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("Cantelli", Accuracy);
        var rows = ReferenceTable.Rows("spread_facts").ToArray();
        table.Tails("scattered tails to one side in 120 digits", rows.Select(row => (
            Math.Log(row.Number("cantelli")),
            Cantelli.Tail(row.Whole("n"), Variance(row), row.Number("margin")))));
        table.Tails("scattered tails to either side in 120 digits", rows.Select(row => (
            Math.Log(row.Number("chebyshev")),
            Cantelli.EitherTail(row.Whole("n"), Variance(row), row.Number("margin")))));
        table.Margins("scattered margins to one side in 120 digits", rows.Select(row => (
            row.Number("r_cantelli"),
            Cantelli.Radius(row.Whole("n"), Variance(row), row.Number("risk")))));
        table.Margins("scattered margins to either side in 120 digits", rows.Select(row => (
            row.Number("r_chebyshev"),
            Cantelli.EitherRadius(row.Whole("n"), Variance(row), row.Number("risk")))));
        table.MustStand();
    }

    static double Variance(ReferenceTable.Row row) => row.Number("deviation") * row.Number("deviation");

    [Theory]
    [InlineData(1, 1, 0.5, 1, 1.4142135623730951)]
    [InlineData(4, 9, 0.1, 4.5, 4.743416490252569)]
    [InlineData(1_000_000_000, 1e300, 1e-300, 3.1622776601683795e295, 3.1622776601683795e295)]
    public void Radii_follow_their_formulas(long trials, double variance, double risk, double one, double either)
    {
        Assert.InRange(Cantelli.Radius(trials, variance, risk) / one, 1, 1 + Accuracy);
        Assert.InRange(Cantelli.EitherRadius(trials, variance, risk) / either, 1, 1 + Accuracy);
    }

    [Theory]
    [InlineData(1, 1e-300, 1e150, 1e-300, 1e-300)]
    [InlineData(1_000_000_000, 1e300, 1e-150, 1, 1)]
    [InlineData(1_000_000_000, 1, 1e-150, 1, 1)]
    [InlineData(1_000_000_000, 1, 1, 1e-9, 1e-9)]
    public void Extreme_arguments_stay_safe(long trials, double variance, double margin, double one, double either)
    {
        Assert.InRange(Cantelli.Tail(trials, variance, margin).Upper / one, 1 - 2e-9, 1 + Accuracy);
        Assert.InRange(Cantelli.EitherTail(trials, variance, margin).Upper / either, 1, 1 + Accuracy);
    }

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number()
    {
        Assert.Null(Cantelli.TrialsNeeded(1, 1e-4, 1e-9));
        Assert.Null(Cantelli.EitherTrialsNeeded(1, 1e-4, 1e-9));
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| trials | deviations | exponential law, above | bound | either side | bound |\n");
        text.Append("| --: | --: | --: | --: | --: | --: |\n");
        foreach (var (trials, spreads) in new[] { (1L, 2.0), (10L, 2.0), (1_000L, 2.0), (1_000L, 6.0) })
        {
            double margin = spreads / Math.Sqrt(trials);
            double above = IncompleteGamma.UpperTail(trials, trials * (1 + margin));
            double both = above + (margin < 1 ? IncompleteGamma.LowerTail(trials, trials * (1 - margin)) : 0);
            double one = Cantelli.Tail(trials, 1, margin).Upper;
            double either = Cantelli.EitherTail(trials, 1, margin).Upper;
            text.Append(CultureInfo.InvariantCulture, $"| {trials:N0} | {spreads} | {above:0.00e+0} | {one:0.00e+0} ");
            text.Append(CultureInfo.InvariantCulture, $"| {both:0.00e+0} | {either:0.00e+0} |\n");
        }

        Repository.MustContain("src/docs/tails/Cantelli.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.Tail(0, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.Tail(5, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.Tail(5, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.EitherTail(5, 1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.EitherTail(5, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.Radius(5, 1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.EitherRadius(5, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.TrialsNeeded(1, 0.1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Cantelli.EitherTrialsNeeded(1, 1e151, 0.1));
    }
}
