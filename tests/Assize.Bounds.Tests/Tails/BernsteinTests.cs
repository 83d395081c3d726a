using Assize.Testing;

namespace Assize.Bounds.Tests;

public class BernsteinTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void It_is_at_least_the_exact_tail_and_at_least_Bennetts()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var item in LatticeCase.Every())
        {
            double bound = Bernstein.Tail(item.Trials, item.Variance, item.Bound, item.Margin).Upper;
            item.AssertCovered(bound);
            double bennett = Bennett.Tail(item.Trials, item.Variance, item.Bound, item.Margin).Upper;
            Assert.True(bound * (1 + Accuracy) >= bennett, $"{item}: {bennett} by Bennett");
            least = Math.Min(least, bound / item.Probability);
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1.2);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("Bernstein", Accuracy);
        table.Tails("exponents in 80 digits", ReferenceTable.Rows("tail_bounds").Select(row => (
            row.Number("ln_bernstein"),
            Bernstein.Tail(
                row.Whole("n"), row.Number("variance"), row.Number("max_upward_deviation"), row.Number("t")))));
        table.Tails("scattered exponents in 120 digits", ReferenceTable.Rows("mean_facts").Select(row => (
            row.Number("ln_bernstein"),
            Bernstein.Tail(row.Whole("n"), row.Number("variance"), row.Number("bound"), row.Number("margin")))));
        table.Margins("margins in 80 digits", ReferenceTable.Rows("bound_radius").Select(row => (
            row.Number("t_bernstein"),
            Bernstein.Radius(row.Whole("n"), row.Number("variance"), row.Number("range"), row.Number("alpha")))));
        table.MustStand();
    }

    // Trials of a plan for a rate: both radii must fit between target and defect.
    [Fact]
    public void Plans_for_a_rate_take_the_trials_computed_elsewhere()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("plan_bounds"))
        {
            Assert.Equal(row.Whole("n_bernstein"), RatePair.Trials(row, Bernstein.Radius));
            seen++;
        }

        Assert.Equal(167, seen);
    }

    // Both sides of a uniform draw, margin 0.01, by its variance and greatest deviation; then of yes/no draws.
    [Theory]
    [InlineData(1 / 12.0, 0.5, 0.01, 1e-2, 9_008)]
    [InlineData(1 / 12.0, 0.5, 0.01, 1e-4, 16_836)]
    [InlineData(1 / 12.0, 0.5, 0.01, 1e-6, 24_665)]
    [InlineData(1 / 12.0, 0.5, 0.01, 1e-9, 36_408)]
    [InlineData(0.0025, 0.5, 0.005, 1e-9, 5_712)]
    [InlineData(0.25, 0.5, 0.01, 1e-2, 26_669)]
    [InlineData(0.25, 0.5, 0.01, 1e-9, 107_796)]
    public void Trials_needed_are_the_first_that_suffice(
        double variance, double bound, double margin, double risk, long trials)
    {
        Assert.Equal(trials, Bernstein.TrialsNeeded(variance, bound, margin, risk / 2));
        Assert.True(Bernstein.Tail(trials, variance, bound, margin).Upper <= risk / 2);
        Assert.True(Bernstein.Tail(trials - 1, variance, bound, margin).Upper > risk / 2);
    }

    [Theory]
    [InlineData(1, 1e-300, 1e-150, 1e-300)]
    [InlineData(1_000_000_000, 1e300, 1e150, 1e-300)]
    [InlineData(1_000_000_000, 1e-300, 1e150, 1e-9)]
    [InlineData(1_000_000_000, 1e300, 1e-150, 0.999999)]
    public void Extreme_facts_have_a_radius_that_keeps_the_risk(long trials, double variance, double bound, double risk)
    {
        double radius = Bernstein.Radius(trials, variance, bound, risk);

        Assert.InRange(radius, 1e-160, 1e160);
        Assert.InRange(Bernstein.Tail(trials, variance, bound, radius * (1 + 1e-11)).Upper, 0, risk * (1 + 1e-11));
        Assert.Equal(1, Bernstein.Tail(trials, variance, bound, 0).Upper);
        Assert.Equal(1e-300, Bernstein.Tail(trials, variance, bound, double.MaxValue).Upper);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is() => Repository.MustContain(
        "src/docs/tails/Bernstein.md",
        "measured",
        YesNoDraws.Table(
            YesNoDraws.ByVariance(Bernstein.Tail), "Bentkus", YesNoDraws.ByVariance(BentkusVariance.Tail)));

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number() =>
        Assert.Null(Bernstein.TrialsNeeded(1, 1, 1e-9, 1e-9));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(0, 1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(5, 0, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(5, double.NaN, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(5, 1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(5, 1, 1e151, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(5, 1, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Tail(5, 1, 1, -1e-9));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Radius(5, 1, 1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.Radius(5, 1, 1, 9e-301));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.TrialsNeeded(1, 1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bernstein.TrialsNeeded(1, 1, 0.1, double.NaN));
    }
}
