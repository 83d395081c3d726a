using Assize.Testing;

namespace Assize.Bounds.Tests;

public class HoeffdingVarianceTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void It_lies_between_the_exact_tail_and_Bennetts_bound()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var item in LatticeCase.Every())
        {
            double bound = HoeffdingVariance.Tail(item.Trials, item.Variance, item.Bound, item.Margin).Upper;
            item.AssertCovered(bound);
            double bennett = Bennett.Tail(item.Trials, item.Variance, item.Bound, item.Margin).Upper;
            Assert.True(bound <= bennett * (1 + Accuracy), $"{item}: {bennett} by Bennett");
            least = Math.Min(least, bound / item.Probability);
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1 + Accuracy);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("HoeffdingVariance", Accuracy);

        // For a yes/no draw of rate p, variance p(1 - p) and bound 1 - p give the divergence of p + t from p.
        var draws = ReferenceTable.Rows("tail_bounds").Where(row => row.Text("kind") == "bernoulli");
        table.Tails("divergences in 80 digits", draws.Select(row => (
            row.Number("ln_chernoff_kl"),
            HoeffdingVariance.Tail(
                row.Whole("n"), row.Number("variance"), row.Number("max_upward_deviation"), row.Number("t")))));
        table.Tails("scattered exponents in 120 digits", ReferenceTable.Rows("mean_facts").Select(row => (
            row.Number("ln_hoeffding"),
            HoeffdingVariance.Tail(
                row.Whole("n"), row.Number("variance"), row.Number("bound"), row.Number("margin")))));
        table.MustStand();
    }

    [Fact]
    public void Plans_for_a_rate_take_the_trials_of_Chernoffs_bound_or_fewer()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("plan_bounds"))
        {
            // Radii add up to the gap a little earlier than one exponent's two roots, never by a trial more.
            long trials = RatePair.Trials(row, HoeffdingVariance.Radius);
            Assert.InRange(trials, row.Whole("n_all"), row.Whole("n_bennett"));
            Assert.InRange(trials, row.Whole("n_chernoff_kl") - 1, row.Whole("n_chernoff_kl") + 1);
            seen++;
        }

        Assert.Equal(167, seen);
    }

    // Both sides of yes/no draws of rate 1/2, margin 0.01: the divergence; computed elsewhere.
    [Theory]
    [InlineData(1e-2, 26_490)]
    [InlineData(1e-4, 49_515)]
    [InlineData(1e-6, 72_539)]
    [InlineData(1e-9, 107_075)]
    public void Trials_needed_are_the_first_that_suffice(double risk, long trials)
    {
        Assert.Equal(trials, HoeffdingVariance.TrialsNeeded(0.25, 0.5, 0.01, risk / 2));
        Assert.True(HoeffdingVariance.Tail(trials, 0.25, 0.5, 0.01).Upper <= risk / 2);
        Assert.True(HoeffdingVariance.Tail(trials - 1, 0.25, 0.5, 0.01).Upper > risk / 2);
    }

    [Theory]
    [InlineData(100, 0.25, 0.5, 1e-3)]
    [InlineData(10_000, 1e-4, 1, 1e-9)]
    [InlineData(1_000_000, 3, 7, 1e-300)]
    [InlineData(1_000_000_000, 100, 1, 1e-6)]
    [InlineData(1_000_000_000, 1e-9, 1, 0.999)]
    public void The_radius_undoes_the_tail_on_the_safe_side(long trials, double variance, double bound, double risk)
    {
        double radius = HoeffdingVariance.Radius(trials, variance, bound, risk);

        Assert.InRange(HoeffdingVariance.Tail(trials, variance, bound, radius).Upper, 0, risk * (1 + Accuracy));
        Assert.True(HoeffdingVariance.Tail(trials, variance, bound, radius * (1 - 1e-11)).Upper > risk);
    }

    [Fact]
    public void At_the_bound_it_is_the_probability_of_the_greatest_values_and_beyond_it_is_none()
    {
        Assert.Equal(0.125, HoeffdingVariance.Tail(3, 0.25, 0.5, 0.5).Upper, 1e-12);
        Assert.Equal(0, HoeffdingVariance.Tail(3, 0.25, 0.5, 0.50000000000001).Upper);
        Assert.Equal(0.5, HoeffdingVariance.Radius(3, 0.25, 0.5, 0.1));
        Assert.Equal(1, HoeffdingVariance.TrialsNeeded(0.25, 0.5, 0.6, 1e-9));
    }

    [Theory]
    [InlineData(1, 1e-300, 1e-150, 1e-150)]
    [InlineData(1_000_000_000, 1e300, 1e150, 1e140)]
    [InlineData(1_000_000_000, 1e300, 1e-150, 1e-150)]
    [InlineData(1_000_000_000, 1e-300, 1e150, 1e150)]
    [InlineData(1_000_000_000, 1e-300, 1e150, 1e-160)]
    [InlineData(7, 1, 1, 0)]
    [InlineData(7, 1, 1, 5e-324)]
    public void Extreme_facts_give_a_probability_no_less_than_Bentkus_says(
        long trials, double variance, double bound, double margin)
    {
        double tail = HoeffdingVariance.Tail(trials, variance, bound, margin).Upper;

        Assert.InRange(tail, BentkusVariance.Tail(trials, variance, bound, margin).Upper * (1 - 1e-10), 1);
    }

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number() =>
        Assert.Null(HoeffdingVariance.TrialsNeeded(1, 1, 1e-9, 1e-9));

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is() => Repository.MustContain(
        "src/docs/tails/HoeffdingVariance.md",
        "measured",
        YesNoDraws.Table(
            YesNoDraws.ByVariance(HoeffdingVariance.Tail), "Bennett", YesNoDraws.ByVariance(Bennett.Tail)));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Tail(0, 1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Tail(5, 0, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Tail(5, 1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Tail(5, 1, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Tail(5, 1, 1, -0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Radius(5, 1, 1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.Radius(5, double.NaN, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.TrialsNeeded(1, 1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => HoeffdingVariance.TrialsNeeded(1, 1, 0.1, 0));
    }
}
