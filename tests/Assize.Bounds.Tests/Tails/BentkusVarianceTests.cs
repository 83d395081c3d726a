using Assize.Testing;

namespace Assize.Bounds.Tests;

public class BentkusVarianceTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void It_is_at_least_the_exact_tail_and_reached_by_two_values()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var item in LatticeCase.Every())
        {
            double bound = BentkusVariance.Tail(item.Trials, item.Variance, item.Bound, item.Margin).Upper;
            item.AssertCovered(bound);
            least = Math.Min(least, bound / item.Probability);
            if (item.Top == 1)
                Assert.True(bound <= 3.6946 * item.Probability, $"{item}: {bound}");
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1 + 1e-11);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("BentkusVariance", Accuracy);
        table.Tails("least ratios from whole numbers", ReferenceTable.Rows("bentkus_variance").Select(row => (
            row.Number("ln_tail"),
            BentkusVariance.Tail(
                row.Whole("n"), row.Number("variance"), row.Number("bound"), row.Number("margin")))));
        table.MustStand();
    }

    // Trials for both sides from the variance of a uniform draw on [0, 1], margin 0.01, and of one of deviation 0.05 in
    // [0, 1] about 1/2, margin 0.005; computed elsewhere.
    [Theory]
    [InlineData(1 / 12.0, 0.01, 1e-2, 7_470)]
    [InlineData(1 / 12.0, 0.01, 1e-4, 14_789)]
    [InlineData(1 / 12.0, 0.01, 1e-6, 22_267)]
    [InlineData(1 / 12.0, 0.01, 1e-9, 33_617)]
    [InlineData(0.0025, 0.005, 1e-2, 1_120)]
    [InlineData(0.0025, 0.005, 1e-4, 2_237)]
    [InlineData(0.0025, 0.005, 1e-6, 3_380)]
    [InlineData(0.0025, 0.005, 1e-9, 5_115)]
    public void Trials_needed_are_the_first_that_suffice(double variance, double margin, double risk, long trials)
    {
        Assert.Equal(trials, BentkusVariance.TrialsNeeded(variance, 0.5, margin, risk / 2));
        Assert.True(BentkusVariance.Tail(trials, variance, 0.5, margin).Upper <= risk / 2);
        Assert.True(BentkusVariance.Tail(trials - 1, variance, 0.5, margin).Upper > risk / 2);
    }

    [Fact]
    public void Yes_no_draws_by_the_hundred_are_covered_and_by_no_more_than_half_e_squared()
    {
        int seen = 0;
        foreach (int trials in new[] { 20, 77, 300 })
        {
            foreach (double rate in new[] { 0.5, 0.3, 0.1, 0.01, 0.9 })
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = (int)(trials * rate) + 1; successes <= trials; successes++)
                {
                    double margin = successes / (double)trials - rate;
                    double bound = BentkusVariance.Tail(
                        trials, rate * (1 - rate), 1 - rate, Math.Min(margin, 1 - rate)).Upper;
                    Assert.True(exact.CompareAtLeast(successes, bound) <= 0, $"{trials} {rate} {successes}");
                    double least = bound / 3.694528049465326 * (1 - Accuracy);
                    Assert.True(
                        exact.CompareAtLeast(successes, least) >= 0 || bound == 1e-300, $"{trials} {rate} {successes}");
                    seen++;
                }
            }
        }

        Assert.True(seen > 1_200, $"only {seen} cases");
    }

    // Rounding must not lift the margin above the greatest sum.
    [Fact]
    public void At_the_bound_it_is_the_probability_that_every_value_is_the_greatest()
    {
        var random = new Random(61);
        int seen = 0;
        for (int i = 0; i < 3_000; i++)
        {
            int trials = 1 + random.Next(20);
            double bound = Math.Pow(10, 4 * random.NextDouble() - 2);
            double variance = Math.Pow(10, 4 * random.NextDouble() - 3) * bound * bound;
            double truth = trials * Math.Log(variance / (variance + bound * bound));
            double tail = BentkusVariance.Tail(trials, variance, bound, bound).Upper;
            Assert.InRange(Math.Log(tail) - truth, -1e-13, Accuracy);
            seen++;
        }

        Assert.Equal(3_000, seen);
    }

    [Fact]
    public void Next_to_a_value_of_the_sum_it_is_not_below_the_formula()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("bentkus_steps").Where(row => row.Text("kind") == "variance"))
        {
            double least = Math.Min(0, Math.Max(-690.7755278982137, row.Number("ln_tail"))) - 2e-13;
            double tail = BentkusVariance.Tail(row.Whole("n"), row.Number("mean"), 1, row.Number("margin")).Upper;
            Assert.True(Math.Log(tail) >= least, $"{row}: {tail:R}");
            seen++;
        }

        Assert.Equal(108, seen);
    }

    [Fact]
    public void Yes_no_draws_up_to_a_billion_are_covered()
    {
        int seen = 0;
        foreach (var (trials, rate, successes) in YesNoDraws.ByChance(seed: 59, number: 2_000))
        {
            // Failures above their mean are the same draws with most of the mass at the top.
            bool above = successes > trials * rate;
            double bound = above ? 1 - rate : rate;
            double margin = Math.Min(bound, Math.Abs(successes / (double)trials - rate)) * (1 - 1e-15);
            double tail = BentkusVariance.Tail(trials, rate * (1 - rate), bound, margin).Upper;
            double exact = above
                ? BinomialTail.UpperTail(trials, successes, rate).Lower
                : BinomialTail.LowerTail(trials, successes, rate).Lower;
            Assert.True(exact <= tail, $"{trials} {rate:R} {successes}: {tail:R} is below {exact:R}");
            seen++;
        }

        Assert.Equal(2_000, seen);
    }

    [Fact]
    public void More_trials_or_margin_never_raise_it_and_more_variance_or_bound_never_lower_it()
    {
        int seen = 0;
        foreach (var (variance, bound) in new[] { (0.25, 0.5), (1e-3, 1.0), (4.0, 1.0), (1e-9, 2.0) })
        {
            for (long trials = 1; trials < 3_000; trials += 1 + trials / 9)
            {
                for (double margin = bound; margin > 1e-4 * bound; margin *= 0.71)
                {
                    double At(long n, double v, double b, double t) => BentkusVariance.Tail(n, v, b, t).Upper;
                    double here = At(trials, variance, bound, margin);
                    double most = here * (1 + 2 * Accuracy), least = here * (1 - 2 * Accuracy);
                    Assert.True(At(trials + 1, variance, bound, margin) <= most, $"{trials} {variance} {margin}");
                    Assert.True(At(trials, variance, bound, margin * 0.97) >= least, $"{trials} {variance} {margin}");
                    Assert.True(At(trials, variance * 1.01, bound, margin) >= least, $"{trials} {variance} {margin}");
                    Assert.True(At(trials, variance, bound * 1.01, margin) >= least, $"{trials} {variance} {margin}");
                    seen++;
                }
            }
        }

        Assert.True(seen > 4_000, $"only {seen} cases");
    }

    [Theory]
    [InlineData(100, 0.25, 0.5, 1e-3)]
    [InlineData(100, 0.25, 0.5, 0.4)]
    [InlineData(10_000, 1e-4, 1, 1e-9)]
    [InlineData(1_000_000, 3, 7, 1e-300)]
    [InlineData(1_000_000_000, 0.25, 0.5, 1e-9)]
    public void The_radius_undoes_the_tail_on_the_safe_side(long trials, double variance, double bound, double risk)
    {
        double radius = BentkusVariance.Radius(trials, variance, bound, risk);

        Assert.True(BentkusVariance.Tail(trials, variance, bound, radius).Upper <= risk);
        Assert.True(BentkusVariance.Tail(trials, variance, bound, radius * (1 - 1e-11)).Upper > risk);
    }

    [Fact]
    public void Where_no_margin_has_so_small_a_risk_the_radius_is_the_bound()
    {
        Assert.Equal(0.5, BentkusVariance.Radius(3, 0.25, 0.5, 0.1));
        Assert.Equal(new Enclosure(0, 0), BentkusVariance.Tail(3, 0.25, 0.5, 0.50001));
        Assert.Equal(0.125, BentkusVariance.Tail(3, 0.25, 0.5, 0.5).Upper, 1e-12);
    }

    [Theory]
    [InlineData(1, 1e-300, 1e-150, 1e-150)]
    [InlineData(1_000_000_000, 1e300, 1e150, 1e140)]
    [InlineData(1_000_000_000, 1e300, 1e-150, 1e-150)]
    [InlineData(1_000_000_000, 1e-300, 1e150, 1e150)]
    [InlineData(1_000_000_000, 1e-300, 1e150, 1e-300)]
    [InlineData(7, 1, 1, 0)]
    [InlineData(7, 1, 1, 5e-324)]
    [InlineData(1_000_000_000, 1e18, 1, 1)]
    public void Extreme_facts_give_a_probability_no_greater_than_Cantelli_says(
        long trials, double variance, double bound, double margin)
    {
        double tail = BentkusVariance.Tail(trials, variance, bound, margin).Upper;

        Assert.InRange(tail, 1e-300, Math.Max(1e-300, (1 + 1e-11) / (1 + trials * (margin * margin / variance))));
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is() => Repository.MustContain(
        "src/docs/tails/BentkusVariance.md",
        "measured",
        YesNoDraws.Table(
            YesNoDraws.ByVariance(BentkusVariance.Tail), "Bernstein", YesNoDraws.ByVariance(Bernstein.Tail)));

    [Fact]
    public void A_margin_that_takes_too_many_trials_has_no_number() =>
        Assert.Null(BentkusVariance.TrialsNeeded(0.25, 0.5, 1e-5, 1e-12));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(0, 1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(1_000_000_001, 1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, 0, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, double.NaN, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, 1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, 1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, 1, 1, -0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, 1, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Tail(5, 1, 1, double.PositiveInfinity));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Radius(5, 1, 1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Radius(5, 1, 1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.Radius(5, 1, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.TrialsNeeded(1, 1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => BentkusVariance.TrialsNeeded(1, 1, 0.1, 9e-301));
    }
}
