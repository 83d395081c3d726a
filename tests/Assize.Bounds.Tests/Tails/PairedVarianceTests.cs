using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class PairedVarianceTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    // Sums of squared differences are whole numbers: 16 less the square, so that the lower tail is an upper one.
    [Fact]
    public void It_is_at_least_the_exact_tail()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var law in LatticeCase.Every().Where(item => item.Trials == 1).GroupBy(item => item.Weights))
        {
            var facts = law.First();
            int most = facts.Top * facts.Top;
            foreach (int pairs in new[] { 1, 2, 4, 8, 20 })
            {
                var sum = new ExactSum(ComplementsOfSquares(facts.Weights), pairs);
                for (int squares = 0; squares < 2 * pairs * facts.Variance * (1 - 1e-12); squares++)
                {
                    double shortfall = 1 - squares / (2 * pairs * facts.Variance) - 1e-14;
                    double tail = PairedVariance.Tail(2 * pairs, facts.Kurtosis, Math.Max(0, shortfall)).Upper;
                    Assert.True(sum.CompareAtLeast(pairs * most - squares, tail) <= 0, $"{facts} {pairs} {squares}");
                    least = Math.Min(least, tail / sum.AtLeast(pairs * most - squares));
                    seen++;
                }
            }
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(least, 1, 1.3);
    }

    static int[] ComplementsOfSquares(int[] weights)
    {
        int top = weights.Length - 1;
        int[] squares = new int[top * top + 1];
        for (int i = 0; i <= top; i++)
        {
            for (int j = 0; j <= top; j++)
                squares[top * top - (i - j) * (i - j)] += weights[i] * weights[j];
        }

        return squares;
    }

    // The squared differences of normal pairs over twice the variance add up to a chi-square law.
    [Fact]
    public void Normal_draws_are_covered()
    {
        int seen = 0;
        foreach (int pairs in new[] { 1, 2, 5, 20, 100, 1_000, 100_000, 10_000_000 })
        {
            for (double shortfall = 0.001; shortfall < 1; shortfall += 0.0493)
            {
                double truth = ChiSquare.LogLowerTail(pairs, pairs * (1 - shortfall));
                double tail = PairedVariance.Tail(2L * pairs, 3, shortfall).Upper;
                Assert.True(truth <= Math.Log(tail), $"{pairs} {shortfall}");
                seen++;
            }
        }

        Assert.Equal(168, seen);
    }

    [Fact]
    public void The_variance_exceeds_its_limit_no_more_often_than_promised()
    {
        int seen = 0;
        double worst = 0;
        foreach (var pairs in new[] { 50, 200, 1_000 })
        {
            foreach (double risk in new[] { 0.3, 0.05, 1e-3, 1e-6 })
            {
                // The limit passes the variance 1 where the mean square is the reciprocal of the limit's factor.
                double factor = PairedVariance.UpperLimit(2 * pairs, 1, 3, risk);
                double chance = ChiSquare.LowerTail(pairs, pairs / factor);
                Assert.True(chance <= risk, $"{pairs} {risk}: {chance}");
                worst = Math.Max(worst, chance / risk);
                seen++;
            }
        }

        Assert.Equal(12, seen);
        Assert.True(worst > 1e-2, $"{worst}");
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("PairedVariance", Accuracy);
        var rows = ReferenceTable.Rows("spread_facts").ToArray();
        table.Tails("scattered tails in 120 digits", rows.Select(row => (
            row.Number("ln_paired"),
            PairedVariance.Tail(
                row.Whole("n"),
                row.Number("kurtosis"),
                Math.Min(1, 30 * row.Number("margin") / row.Number("deviation"))))));
        table.Margins("scattered shares in 120 digits", rows.Select(row => (
            row.Number("r_paired"),
            PairedVariance.Radius(row.Whole("n"), row.Number("kurtosis"), row.Number("risk")))));
        table.MustStand();
    }

    // Kurtosis 9, risk 1e-9, half of the variance: 1,990 values; computed elsewhere.
    [Theory]
    [InlineData(9, 0.5, 1e-9, 1_990)]
    [InlineData(3, 0.1, 1e-3, 8_290)]
    [InlineData(1, 0.999999, 0.5, 6)]
    public void Trials_needed_are_the_first_that_suffice(double kurtosis, double shortfall, double risk, long trials)
    {
        Assert.Equal(trials, PairedVariance.TrialsNeeded(kurtosis, shortfall, risk));
        Assert.True(PairedVariance.Tail(trials, kurtosis, shortfall).Upper <= risk);
        Assert.True(PairedVariance.Tail(trials - 2, kurtosis, shortfall).Upper > risk);
        Assert.Equal(
            PairedVariance.Tail(trials, kurtosis, shortfall), PairedVariance.Tail(trials + 1, kurtosis, shortfall));
    }

    [Theory]
    [InlineData(2, 1, 0.99)]
    [InlineData(1_990, 9, 1e-9)]
    [InlineData(1_000_000_000, 1e6, 1e-300)]
    public void The_radius_and_the_limit_follow_their_formulas(long trials, double kurtosis, double risk)
    {
        double shortfall = Math.Sqrt((kurtosis + 3) * -Math.Log(risk) / (trials / 2));

        Assert.InRange(PairedVariance.Radius(trials, kurtosis, risk) / shortfall, 1, 1 + Accuracy);
        double limit = PairedVariance.UpperLimit(trials, 7, kurtosis, risk);
        if (shortfall < 1)
            Assert.InRange(limit * (1 - shortfall) / 7, 1, 1 + Accuracy);
        else
            Assert.Equal(double.PositiveInfinity, limit);
    }

    [Fact]
    public void Too_few_pairs_have_no_limit_and_tiny_shares_no_number()
    {
        Assert.Equal(double.PositiveInfinity, PairedVariance.UpperLimit(400, 1, 9, 1e-9));
        Assert.Equal(0, PairedVariance.UpperLimit(4_000, 0, 9, 1e-9));
        Assert.Null(PairedVariance.TrialsNeeded(3, 1e-9, 1e-9));
        Assert.Equal(1, PairedVariance.Tail(2, 1e150, 1).Upper, 1e-12);
    }

    [Fact]
    public void Its_page_states_the_limits_it_gives()
    {
        var text = new System.Text.StringBuilder(
            "| kurtosis | risk | trials for half the variance | limit at 10,000 trials |\n| --: | --: | --: | --: |\n");
        foreach (var (kurtosis, risk) in new[] { (3, 1e-2), (3, 1e-9), (9, 1e-2), (9, 1e-9) })
        {
            long needed = PairedVariance.TrialsNeeded(kurtosis, 0.5, risk)!.Value;
            double limit = PairedVariance.UpperLimit(10_000, 1, kurtosis, risk);
            text.Append(CultureInfo.InvariantCulture, $"| {kurtosis} | {risk:0e+0} | {needed:N0} | {limit:0.000} |\n");
        }

        Repository.MustContain("src/docs/tails/PairedVariance.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.Tail(1, 3, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.Tail(4, 0.9, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.Tail(4, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.Tail(4, 3, 1.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.Tail(4, 3, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.Radius(4, 3, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.UpperLimit(4, -1, 3, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.UpperLimit(4, double.NaN, 3, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.TrialsNeeded(3, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.TrialsNeeded(3, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => PairedVariance.TrialsNeeded(3, 0.5, 1));
    }
}
