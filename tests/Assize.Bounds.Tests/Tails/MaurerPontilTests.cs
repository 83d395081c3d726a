using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class MaurerPontilTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    static readonly double[] Risks = [0.9, 0.5, 0.2, 0.05, 0.01, 1e-3];

    [Fact]
    public void Averages_miss_the_mean_by_more_than_the_margin_no_more_often_than_promised()
    {
        int seen = 0, broken = 0;
        foreach (var draws in ThreePoints.Laws())
        {
            foreach (int trials in new[] { 2, 3, 6, 12, 40 })
            {
                foreach (double risk in Risks)
                {
                    double Radius(double variance) => MaurerPontil.Radius(trials, variance, Range(draws), risk);
                    double Either(double variance) => MaurerPontil.EitherRadius(trials, variance, Range(draws), risk);
                    Holds(Chance(draws, trials, (average, variance) => -average > Radius(variance)), risk, draws);
                    Holds(Chance(draws, trials, (average, variance) => average > Radius(variance)), risk, draws);
                    double Beyond(double share) => Chance(
                        draws, trials, (average, variance) => Math.Abs(average) > share * Either(variance));
                    Holds(Beyond(1), risk, draws);
                    broken += Beyond(0.2) > risk ? 1 : 0;
                    seen += 3;
                }
            }
        }

        Assert.Equal(9_000, seen);

        // The same loop notices a margin a fifth as wide.
        Assert.True(broken > 5, $"{broken}");
    }

    [Fact]
    public void Deviations_miss_by_more_than_their_margin_no_more_often_than_promised()
    {
        int seen = 0, broken = 0;
        foreach (var draws in ThreePoints.Laws())
        {
            foreach (int trials in new[] { 2, 3, 6, 12, 40 })
            {
                foreach (double risk in Risks)
                {
                    double margin = MaurerPontil.DeviationRadius(trials, Range(draws), risk);
                    double own = draws.Deviation;
                    double Short(double share) => Chance(
                        draws, trials, (_, variance) => own - Math.Sqrt(variance) > share * margin);
                    Holds(Short(1), risk, draws);
                    Holds(Chance(draws, trials, (_, variance) => Math.Sqrt(variance) - own > margin), risk, draws);
                    broken += Short(0.3) > risk ? 1 : 0;
                    seen += 2;
                }
            }
        }

        Assert.Equal(6_000, seen);
        Assert.True(broken > 5, $"{broken}");
    }

    static void Holds(double chance, double risk, ThreePoints draws) =>
        Assert.True(chance <= risk * (1 + 1e-12), $"{draws}: {chance} against {risk}");

    static double Range(ThreePoints draws) => draws.Points.Max() - draws.Points.Min();

    // Over every outcome: the average and the unbiased variance of the values. The law's mean is 0.
    static double Chance(ThreePoints draws, int trials, Func<double, double, bool> missed)
    {
        double sum = 0;
        for (int i = 0; i <= trials; i++)
        {
            for (int j = 0; i + j <= trials; j++)
            {
                int[] counts = [i, j, trials - i - j];
                double average = counts.Zip(draws.Points, (count, point) => count * point).Sum() / trials;
                double squares = counts.Zip(draws.Points, (count, point) => count * Math.Pow(point - average, 2)).Sum();
                if (missed(average, squares / (trials - 1)))
                    sum += draws.Mass(trials, i, j);
            }
        }

        return sum;
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("MaurerPontil", Accuracy);
        var rows = ReferenceTable.Rows("bound_radius").ToArray();
        table.Margins("margins to one side in 80 digits", rows.Select(row => (
            row.Number("t_empirical_bernstein"),
            MaurerPontil.Radius(row.Whole("n"), row.Number("variance"), row.Number("range"), row.Number("alpha")))));

        // ln(3/1.5r) is ln(2/r).
        table.Margins("margins to either side in 80 digits", rows.Select(row => (
            row.Number("t_empirical_bernstein"),
            MaurerPontil.EitherRadius(
                row.Whole("n"), row.Number("variance"), row.Number("range"), 1.5 * row.Number("alpha")))));
        table.MustStand();
    }

    // Values in [0, 1] of deviation 0.05, margin 0.005 to either side; computed elsewhere.
    [Theory]
    [InlineData(1e-2, 5_067)]
    [InlineData(1e-4, 9_157)]
    [InlineData(1e-6, 13_247)]
    [InlineData(1e-9, 19_382)]
    public void Trials_needed_are_the_first_that_suffice(double risk, long trials)
    {
        Assert.Equal(trials, MaurerPontil.EitherTrialsNeeded(0.0025, 1, 0.005, risk));
        Assert.Equal(trials, MaurerPontil.TrialsNeeded(0.0025, 1, 0.005, risk / 1.5));
        Assert.True(MaurerPontil.EitherRadius(trials, 0.0025, 1, risk) <= 0.005);
        Assert.True(MaurerPontil.EitherRadius(trials - 1, 0.0025, 1, risk) > 0.005);
    }

    [Theory]
    [InlineData(2, 0, 1e-150, 1e-300)]
    [InlineData(1_000_000_000, 1e300, 1e150, 1e-300)]
    [InlineData(1_000_000_000, 0, 1, 0.999)]
    public void Extreme_arguments_follow_the_formulas(long trials, double variance, double range, double risk)
    {
        double odds = Math.Log(2) - Math.Log(risk);
        double radius = Math.Sqrt(variance) * Math.Sqrt(2 * odds / trials) + 7 * range * odds / (3 * (trials - 1.0));
        double deviation = range * Math.Sqrt(-2 * Math.Log(risk) / (trials - 1));

        Assert.InRange(MaurerPontil.Radius(trials, variance, range, risk) / radius, 1, 1 + Accuracy);
        Assert.InRange(MaurerPontil.DeviationRadius(trials, range, risk) / deviation, 1, 1 + Accuracy);
    }

    [Fact]
    public void Two_values_are_the_fewest_and_a_tiny_margin_has_no_number()
    {
        Assert.Equal(2, MaurerPontil.TrialsNeeded(0, 1, 1e9, 0.5));
        Assert.Null(MaurerPontil.TrialsNeeded(1, 1, 1e-9, 1e-9));
    }

    [Fact]
    public void Its_page_states_how_many_trials_it_takes()
    {
        var text = new System.Text.StringBuilder(
            "| risk | variance measured | variance known (Bernstein) | range alone (Bentkus) |\n");
        text.Append("| --: | --: | --: | --: |\n");
        foreach (double risk in new[] { 1e-2, 1e-4, 1e-6, 1e-9 })
        {
            long measured = MaurerPontil.EitherTrialsNeeded(0.0025, 1, 0.005, risk)!.Value;
            long known = Bernstein.TrialsNeeded(0.0025, 0.5, 0.005, risk / 2)!.Value;
            long range = Bentkus.TrialsNeeded(0.5, 0.005, risk / 2)!.Value;
            text.Append(CultureInfo.InvariantCulture, $"| {risk:0e+0} | {measured:N0} | {known:N0} | {range:N0} |\n");
        }

        Repository.MustContain("src/docs/tails/MaurerPontil.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.Radius(1, 0.1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.Radius(5, -1e-9, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.Radius(5, double.NaN, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.Radius(5, 0.1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.EitherRadius(5, 0.1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.EitherRadius(5, 0.1, 1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.DeviationRadius(1, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.DeviationRadius(5, 1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.TrialsNeeded(0.1, 1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => MaurerPontil.EitherTrialsNeeded(0.1, 1, 0.1, double.NaN));
    }
}
