using Assize.Testing;

namespace Assize.Bounds.Tests;

public class BentkusTests
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
            double total = item.Total / (double)item.Top * (1 - 1e-15);
            double mean = item.Mean / item.Top * (1 + 1e-15);
            double above = Bentkus.UpperTail(item.Trials, total, mean).Upper;
            double below = Bentkus.LowerTail(item.Trials, (item.Trials - total) * (1 + 1e-15), 1 - mean).Upper;
            item.AssertCovered(above);
            item.AssertCovered(below);
            item.AssertCovered(Bentkus.Tail(item.Trials, item.Mean / item.Top, item.Margin / item.Top).Upper);
            least = Math.Min(least, above / item.Probability);
            if (item.Top == 1)
                Assert.True(above <= Math.E * item.Probability, $"{item}: {above}");
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1 + 1e-11);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("Bentkus", Accuracy);
        var rows = ReferenceTable.Rows("bentkus").ToArray();
        table.Tails("least ratios above the mean from whole numbers", rows.Select(row => (
            row.Number("ln_upper"),
            Bentkus.Tail(row.Whole("n"), row.Number("mean"), row.Number("margin")))));
        var below = rows.Where(row => row.Has("total"));
        table.Tails("least ratios below the mean from whole numbers", below.Select(row => (
            row.Number("ln_lower"),
            Bentkus.LowerTail(row.Whole("n"), row.Number("total"), row.Number("mean")))));
        table.MustStand();
    }

    // Trials for both sides, margins 0.01 and 0.005 about a mean of 1/2; computed elsewhere.
    [Theory]
    [InlineData(0.01, 1e-2, 20_908)]
    [InlineData(0.01, 1e-4, 42_463)]
    [InlineData(0.01, 1e-6, 64_557)]
    [InlineData(0.01, 1e-9, 98_130)]
    [InlineData(0.005, 1e-2, 83_633)]
    [InlineData(0.005, 1e-4, 169_858)]
    [InlineData(0.005, 1e-6, 258_238)]
    [InlineData(0.005, 1e-9, 392_535)]
    public void Trials_needed_are_the_first_that_suffice(double margin, double risk, long trials)
    {
        Assert.Equal(trials, Bentkus.TrialsNeeded(0.5, margin, risk / 2));
        Assert.True(Bentkus.Tail(trials, 0.5, margin).Upper <= risk / 2);
        Assert.True(Bentkus.Tail(trials - 1, 0.5, margin).Upper > risk / 2);
    }

    // Both tails of a rate of 0.01 together, margin 0.005; computed elsewhere.
    [Theory]
    [InlineData(1e-2, 3_346)]
    [InlineData(1e-4, 7_132)]
    [InlineData(1e-6, 11_132)]
    [InlineData(1e-9, 17_261)]
    public void Both_tails_of_a_small_rate_take_the_published_trials(double risk, long trials)
    {
        double Both(long n) => Bentkus.Tail(n, 0.01, 0.005).Upper + Bentkus.LowerTail(n, n * 0.005, 0.01).Upper;

        Assert.True(Both(trials) <= risk, $"{Both(trials)}");
        Assert.True(Both(trials - 1) > risk, $"{Both(trials - 1)}");
    }

    // Any law on [0, 1], margin 0.01 about 1/2, missed defects at most 1e-3: both radii must fit; computed elsewhere.
    [Theory]
    [InlineData(1e-2, 97_924)]
    [InlineData(1e-4, 140_174)]
    [InlineData(1e-6, 178_433)]
    [InlineData(1e-9, 231_928)]
    public void Plans_for_two_errors_take_the_trials_computed_elsewhere(double risk, long trials)
    {
        double Reach(long n) => Bentkus.Radius(n, 0.5, risk / 2) + Bentkus.Radius(n, 0.49, 1e-3);

        Assert.InRange(Reach(trials), 0.0099, 0.01);
        Assert.True(Reach(trials - 2) > 0.01);
    }

    [Fact]
    public void Yes_no_draws_by_the_hundred_are_covered_and_by_no_more_than_e()
    {
        int seen = 0;
        foreach (int trials in new[] { 20, 77, 300 })
        {
            foreach (double rate in new[] { 0.5, 0.3, 0.1, 0.01, 0.9 })
            {
                var exact = new ExactBinomial(trials, rate);
                for (int successes = 0; successes <= trials; successes++)
                {
                    bool above = successes > trials * rate;
                    double bound = above
                        ? Bentkus.UpperTail(trials, successes, rate).Upper
                        : Bentkus.LowerTail(trials, successes, rate).Upper;
                    Func<double, int> compare = above
                        ? value => exact.CompareAtLeast(successes, value)
                        : value => exact.CompareAtMost(successes, value);
                    Assert.True(compare(bound) <= 0, $"{trials} {rate} {successes}");
                    double least = bound / Math.E * (1 - Accuracy);
                    Assert.True(compare(least) >= 0 || bound == 1e-300, $"{trials} {rate} {successes}");
                    seen++;
                }
            }
        }

        Assert.Equal(2_000, seen);
    }

    [Fact]
    public void More_trials_or_margin_never_raise_it()
    {
        int seen = 0;
        foreach (double mean in new[] { 0.5, 0.1, 1e-3, 0.97, 1e-9 })
        {
            for (long trials = 1; trials < 3_000; trials += 1 + trials / 9)
            {
                for (double margin = 1 - mean; margin > 1e-4; margin *= 0.71)
                {
                    double here = Bentkus.Tail(trials, mean, margin).Upper;
                    double slack = here * (1 + 2 * Accuracy);
                    Assert.True(Bentkus.Tail(trials + 1, mean, margin).Upper <= slack, $"{trials} {mean} {margin}");
                    Assert.True(Bentkus.Tail(trials, mean, margin * 0.97).Upper * (1 + 2 * Accuracy) >= here);
                    seen++;
                }
            }
        }

        Assert.True(seen > 4_000, $"only {seen} cases");
    }

    [Theory]
    [InlineData(100, 0.5, 1e-3)]
    [InlineData(100, 0.5, 0.4)]
    [InlineData(10_000, 1e-4, 1e-9)]
    [InlineData(1_000_000, 0.3, 1e-300)]
    [InlineData(1_000_000_000, 0.5, 1e-9)]
    [InlineData(1_000_000_000, 1e-300, 1e-9)]
    public void The_radius_undoes_the_tail_on_the_safe_side(long trials, double mean, double risk)
    {
        double radius = Bentkus.Radius(trials, mean, risk);

        Assert.True(Bentkus.Tail(trials, mean, radius).Upper <= risk);
        Assert.True(Bentkus.Tail(trials, mean, radius * (1 - 1e-11)).Upper > risk);
    }

    [Fact]
    public void At_the_ends_of_the_range_it_is_the_probability()
    {
        Assert.Equal(0.5, Bentkus.Radius(3, 0.5, 0.1));
        Assert.Equal((0, 0), (Bentkus.Radius(5, 0, 0.1), Bentkus.Radius(5, 1, 0.1)));
        Assert.Equal(0.125, Bentkus.UpperTail(3, 3, 0.5).Upper, 1e-12);
        Assert.Equal(0.125, Bentkus.LowerTail(3, 0, 0.5).Upper, 1e-12);
        Assert.Equal((1, 0, 0), (Bentkus.UpperTail(3, 1.5, 0.5).Upper, Bentkus.UpperTail(3, 1, 0).Upper,
            Bentkus.Tail(3, 0.5, 0.51).Upper));
        Assert.Equal((1, 0), (Bentkus.UpperTail(3, 3, 1).Upper, Bentkus.LowerTail(3, 2, 1).Upper));
        Assert.InRange(Bentkus.Tail(1_000_000_000, 0.5, 0.5).Upper, 1e-300, 1e-300);
        Assert.InRange(Bentkus.UpperTail(1_000_000_000, 1, 1e-300).Upper, 1e-291, 1.0001e-291);
        Assert.Equal(1e-3, Bentkus.LowerTail(1_000_000_000, 999_999_999, 1 - 1e-12).Upper, 1e-3);
    }

    [Fact]
    public void Next_to_a_value_of_the_sum_it_is_not_below_the_formula()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("bentkus_steps").Where(row => row.Text("kind") == "range"))
        {
            double least = Math.Min(0, Math.Max(-690.7755278982137, row.Number("ln_tail"))) - 2e-13;
            double tail = Bentkus.Tail(row.Whole("n"), row.Number("mean"), row.Number("margin")).Upper;
            Assert.True(Math.Log(tail) >= least, $"{row}: {tail:R}");
            seen++;
        }

        Assert.Equal(96, seen);
    }

    [Fact]
    public void Yes_no_draws_up_to_a_billion_are_covered()
    {
        int seen = 0;
        foreach (var (trials, rate, successes) in YesNoDraws.ByChance(seed: 53, number: 1_500))
        {
            bool above = successes > trials * rate;
            double bound = above
                ? Bentkus.UpperTail(trials, successes, rate).Upper
                : Bentkus.LowerTail(trials, successes, rate).Upper;
            double exact = above
                ? BinomialTail.UpperTail(trials, successes, rate).Lower
                : BinomialTail.LowerTail(trials, successes, rate).Lower;
            Assert.True(exact <= bound, $"{trials} {rate:R} {successes}: {bound:R} is below {exact:R}");
            if (bound is < 0.5 and > 1e-300)
                Assert.True(bound <= Math.E * exact * (1 + Accuracy), $"{trials} {rate:R} {successes}");
            seen++;
        }

        Assert.Equal(1_500, seen);
    }

    // No success in 1e9 trials of rate m·1e-9 has probability e^(n ln(1 - p)), and so has the bound, by u = m or 1.
    // The mean of the failures, 1e9 - m, cannot be told from 1e9 - 1 in a double.
    [Fact]
    public void The_mean_of_nearly_as_many_failures_as_trials_is_not_rounded()
    {
        int seen = 0;
        for (int i = -40; i <= 40; i++)
        {
            double rate = (1 + i * 3e-9) * 1e-9;
            double truth = Math.Exp(1e9 * Elementary.LogOnePlus(-rate));
            Assert.InRange(Bentkus.LowerTail(1_000_000_000, 0, rate).Upper / truth, 1, 1 + Accuracy);
            seen++;
        }

        Assert.Equal(81, seen);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_tail_it_is() => Repository.MustContain(
        "src/docs/tails/Bentkus.md",
        "measured",
        YesNoDraws.Table(
            (trials, rate, successes) => Bentkus.UpperTail(trials, successes, rate).Upper,
            "Hoeffding",
            (trials, rate, successes) => Hoeffding.UpperTail(trials, successes / (double)trials, rate).Upper));

    [Fact]
    public void A_margin_that_takes_too_many_trials_has_no_number() =>
        Assert.Null(Bentkus.TrialsNeeded(0.5, 1e-5, 1e-12));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.UpperTail(0, 0, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.UpperTail(1_000_000_001, 5, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.UpperTail(5, 5.1, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.UpperTail(5, -0.1, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.UpperTail(5, double.NaN, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.LowerTail(5, 3, 1.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.LowerTail(5, 3, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.Tail(5, 0.5, 1.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.Tail(5, 0.5, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.Radius(5, 0.5, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.Radius(5, 0.5, 9e-301));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.TrialsNeeded(0.5, 0.6, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.TrialsNeeded(0.5, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Bentkus.TrialsNeeded(0.5, 0.1, double.NaN));
    }
}
