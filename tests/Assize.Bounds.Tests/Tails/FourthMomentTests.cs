using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class FourthMomentTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void It_is_at_least_both_exact_tails_and_a_fair_draw_reaches_it()
    {
        int seen = 0;
        double least = double.MaxValue;
        foreach (var item in LatticeCase.Every())
        {
            double bound = FourthMoment.EitherTail(
                item.Trials, Math.Sqrt(item.Variance) * (1 + 1e-15), item.Kurtosis, item.Margin).Upper;
            item.AssertBothSidesCovered(bound);
            least = Math.Min(least, bound / item.Probability);
            seen++;
        }

        Assert.True(seen > 10_000, $"only {seen} cases");

        // Half of it is to this side of the mean where the law is symmetric.
        Assert.InRange(least, 1, 2.1);
        Assert.InRange(FourthMoment.EitherTail(1, 0.5, 1, 0.5 * (1 + 1e-11)).Upper, 1 - 1e-10, 1);
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
                double both = IncompleteGamma.UpperTail(trials, trials * (1 + margin))
                    + (margin < 1 ? IncompleteGamma.LowerTail(trials, trials * (1 - margin)) : 0);
                Assert.True(both <= FourthMoment.EitherTail(trials, 1, 9, margin).Upper);
                seen++;
            }
        }

        Assert.Equal(110, seen);
    }

    // An exponential law (kurtosis 9), margin 0.05; computed elsewhere, the last printed as 2.2e7.
    [Theory]
    [InlineData(1e-2, 6_930, 6_930)]
    [InlineData(1e-4, 69_284, 69_284)]
    [InlineData(1e-6, 692_822, 692_822)]
    [InlineData(1e-9, 21_500_000, 22_500_000)]
    public void Trials_needed_are_the_first_that_suffice(double risk, long least, long most)
    {
        long needed = FourthMoment.EitherTrialsNeeded(1, 9, 0.05, risk)!.Value;

        Assert.InRange(needed, least, most);
        Assert.True(FourthMoment.EitherTail(needed, 1, 9, 0.05).Upper <= risk);
        Assert.True(FourthMoment.EitherTail(needed - 1, 1, 9, 0.05).Upper > risk);
    }

    // E(S - ES)⁴ = nκσ⁴ + 3n(n - 1)σ⁴ against the sum over all pairs of totals, for every law at hand.
    [Fact]
    public void The_fourth_moment_of_a_sum_is_the_one_summed_up()
    {
        int seen = 0;
        foreach (var draws in ThreePoints.Laws())
        {
            double variance = draws.Deviation * draws.Deviation;
            double kurtosis = draws.Points.Zip(draws.Masses, (point, mass) => mass * Math.Pow(point, 4)).Sum()
                / (variance * variance);
            foreach (int trials in new[] { 1, 2, 7, 20 })
            {
                double moment = 0;
                for (int i = 0; i <= trials; i++)
                {
                    for (int j = 0; i + j <= trials; j++)
                    {
                        double sum = i * draws.Points[0] + j * draws.Points[1] + (trials - i - j) * draws.Points[2];
                        moment += draws.Mass(trials, i, j) * Math.Pow(sum, 4);
                    }
                }

                double margin = 100 * draws.Deviation * Math.Sqrt(kurtosis);
                double bound = FourthMoment.EitherTail(trials, draws.Deviation, kurtosis, margin).Upper;
                Assert.InRange(bound / (moment / Math.Pow(trials * margin, 4)), 1 - 1e-11, 1 + Accuracy);
                seen++;
            }
        }

        Assert.Equal(400, seen);
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("FourthMoment", Accuracy);
        var rows = ReferenceTable.Rows("spread_facts").ToArray();
        table.Tails("scattered tails in 120 digits", rows.Select(row => (
            Math.Log(row.Number("fourth")),
            FourthMoment.EitherTail(
                row.Whole("n"), row.Number("deviation"), row.Number("kurtosis"), row.Number("margin")))));
        table.Margins("scattered margins in 120 digits", rows.Select(row => (
            row.Number("r_fourth"),
            FourthMoment.EitherRadius(
                row.Whole("n"), row.Number("deviation"), row.Number("kurtosis"), row.Number("risk")))));
        table.MustStand();
    }

    [Theory]
    [InlineData(1, 1, 1, 0.5)]
    [InlineData(1000, 3, 9, 1e-6)]
    [InlineData(1_000_000_000, 1e150, 1e150, 1e-300)]
    [InlineData(7, 1e-140, 2, 0.9)]
    public void The_radius_undoes_the_tail_on_the_safe_side(long trials, double deviation, double kurtosis, double risk)
    {
        double radius = FourthMoment.EitherRadius(trials, deviation, kurtosis, risk);
        if (radius <= 1e150)
        {
            double tail = FourthMoment.EitherTail(trials, deviation, kurtosis, radius).Upper;
            Assert.InRange(tail / risk, 1 - Accuracy, 1 + Accuracy);
        }

        double root = Math.Sqrt(Math.Sqrt(3 + (kurtosis - 3) / trials)) / Math.Sqrt(Math.Sqrt(risk));
        Assert.InRange(radius / (deviation / Math.Sqrt(trials) * root), 1 - 1e-15, 1 + Accuracy);
    }

    [Fact]
    public void More_trials_never_raise_it_whatever_the_kurtosis()
    {
        int seen = 0;
        foreach (double kurtosis in new[] { 1, 1.5, 2.9, 3, 9, 1e6 })
        {
            for (long trials = 1; trials < 1_000; trials++)
            {
                Assert.True(FourthMoment.EitherTail(trials + 1, 1, kurtosis, 50).Upper
                    <= FourthMoment.EitherTail(trials, 1, kurtosis, 50).Upper * (1 + 1e-15), $"{kurtosis} {trials}");
                seen++;
            }
        }

        Assert.Equal(5_994, seen);
    }

    [Theory]
    [InlineData(1, 1e-150, 1, 1e150, 1e-300)]
    [InlineData(1_000_000_000, 1e150, 1e150, 1e-150, 1)]
    [InlineData(1_000_000_000, 1, 3, 1, 3e-18)]
    public void Extreme_arguments_stay_safe(
        long trials, double deviation, double kurtosis, double margin, double bound) =>
        Assert.InRange(FourthMoment.EitherTail(trials, deviation, kurtosis, margin).Upper / bound, 1, 1 + Accuracy);

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number() =>
        Assert.Null(FourthMoment.EitherTrialsNeeded(1, 3, 1e-6, 1e-9));

    [Fact]
    public void Its_page_states_how_many_trials_it_takes()
    {
        var text = new System.Text.StringBuilder("| risk | fourth moment | Chebyshev | Catoni |\n");
        text.Append("| --: | --: | --: | --: |\n");
        foreach (double risk in new[] { 1e-2, 1e-4, 1e-6, 1e-9 })
        {
            long fourth = FourthMoment.EitherTrialsNeeded(1, 9, 0.05, risk)!.Value;
            long catoni = Catoni.TrialsNeeded(1, 0.05, risk / 2)!.Value;
            text.Append(CultureInfo.InvariantCulture, $"| {risk:0e+0} | {fourth:N0} | {400 / risk:N0} ");
            text.Append(CultureInfo.InvariantCulture, $"| {catoni:N0} |\n");
        }

        Repository.MustContain("src/docs/tails/FourthMoment.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTail(0, 1, 3, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTail(5, 0, 3, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTail(5, 1, 0.99, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTail(5, 1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTail(5, 1, 3, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherRadius(5, double.NaN, 3, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherRadius(5, 1, 3, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTrialsNeeded(1, 3, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => FourthMoment.EitherTrialsNeeded(1, 3, 0.1, 1));
    }
}
