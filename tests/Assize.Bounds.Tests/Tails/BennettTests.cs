using Assize.Testing;

namespace Assize.Bounds.Tests;

public class BennettTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void It_is_at_least_the_exact_tail()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var item in LatticeCase.Every())
        {
            double bound = Bennett.Tail(item.Trials, item.Variance, item.Bound, item.Margin).Upper;
            item.AssertCovered(bound);
            least = Math.Min(least, bound / item.Probability);
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1.2);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("Bennett", Accuracy);
        table.Tails("exponents in 80 digits", ReferenceTable.Rows("tail_bounds").Select(row => (
            row.Number("ln_bennett"),
            Bennett.Tail(
                row.Whole("n"), row.Number("variance"), row.Number("max_upward_deviation"), row.Number("t")))));
        table.Tails("scattered exponents in 120 digits", ReferenceTable.Rows("mean_facts").Select(row => (
            row.Number("ln_bennett"),
            Bennett.Tail(row.Whole("n"), row.Number("variance"), row.Number("bound"), row.Number("margin")))));
        table.Margins("margins in 80 digits", ReferenceTable.Rows("bound_radius").Select(row => (
            row.Number("t_bennett"),
            Bennett.Radius(row.Whole("n"), row.Number("variance"), row.Number("range"), row.Number("alpha")))));
        table.MustStand();
    }

    // Trials of a plan for a rate: both radii must fit between target and defect.
    [Fact]
    public void Plans_for_a_rate_take_the_trials_computed_elsewhere()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("plan_bounds"))
        {
            Assert.Equal(row.Whole("n_bennett"), RatePair.Trials(row, Bennett.Radius));
            seen++;
        }

        Assert.Equal(167, seen);
    }

    // Both sides of a draw in [0, 1] of deviation 0.05 about 1/2, margin 0.005; computed elsewhere.
    [Theory]
    [InlineData(0.0025, 0.5, 0.005, 1e-2, 1_372)]
    [InlineData(0.0025, 0.5, 0.005, 1e-4, 2_564)]
    [InlineData(0.0025, 0.5, 0.005, 1e-6, 3_756)]
    [InlineData(0.0025, 0.5, 0.005, 1e-9, 5_545)]
    public void Trials_needed_are_the_first_that_suffice(
        double variance, double bound, double margin, double risk, long trials)
    {
        Assert.Equal(trials, Bennett.TrialsNeeded(variance, bound, margin, risk / 2));
        Assert.True(Bennett.Tail(trials, variance, bound, margin).Upper <= risk / 2);
        Assert.True(Bennett.Tail(trials - 1, variance, bound, margin).Upper > risk / 2);
    }

    [Theory]
    [InlineData(1, 1e-300, 1e-150, 1e-300)]
    [InlineData(1_000_000_000, 1e300, 1e150, 1e-300)]
    [InlineData(1_000_000_000, 1e-300, 1e150, 1e-9)]
    [InlineData(1_000_000_000, 1e300, 1e-150, 0.999999)]
    public void Extreme_facts_have_a_radius_that_keeps_the_risk(long trials, double variance, double bound, double risk)
    {
        double radius = Bennett.Radius(trials, variance, bound, risk);

        Assert.InRange(radius, 1e-160, 1e160);
        Assert.InRange(Bennett.Tail(trials, variance, bound, radius * (1 + 1e-11)).Upper, 0, risk * (1 + 1e-11));
        Assert.Equal(1, Bennett.Tail(trials, variance, bound, 0).Upper);
        Assert.Equal(1e-300, Bennett.Tail(trials, variance, bound, double.MaxValue).Upper);
    }

    // h(u) at u = 1/8 and 8: h(1) = 2 ln 2 - 1, h(e - 1) = 1, and the series u²/2 - u³/6 + u⁴/12 far below 1.
    [Theory]
    [InlineData(1, 0.386294361119890618834)]
    [InlineData(1.718281828459045, 1)]
    [InlineData(1e-5, 4.99998333341666641666e-11)]
    [InlineData(1e-19, 5e-39)]
    [InlineData(1e-21, 5e-43)]
    public void The_exponent_follows_its_formula(double margin, double exponent)
    {
        long trials = (long)(20 / exponent);
        double expected = trials > 0 ? trials * exponent : exponent;
        if (trials < 1e18)
            Assert.Equal(expected, -Math.Log(Bennett.Tail(Math.Max(1, trials), 1, 1, margin).Upper), 1e-11);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is() => Repository.MustContain(
        "src/docs/tails/Bennett.md",
        "measured",
        YesNoDraws.Table(YesNoDraws.ByVariance(Bennett.Tail), "Bernstein", YesNoDraws.ByVariance(Bernstein.Tail)));

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number() =>
        Assert.Null(Bennett.TrialsNeeded(1, 1, 1e-9, 1e-9));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(0, 1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(5, 0, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(5, double.NaN, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(5, 1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(5, 1, 1e151, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(5, 1, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Tail(5, 1, 1, -1e-9));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Radius(5, 1, 1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.Radius(5, 1, 1, 9e-301));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.TrialsNeeded(1, 1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bennett.TrialsNeeded(1, 1, 0.1, double.NaN));
    }
}
