using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class MassartTests
{
    // The documented accuracy.
    const double Accuracy = 2e-11;

    // Every outcome of so many draws on three points: the empirical distribution function strays at the first two only.
    [Fact]
    public void It_is_at_least_the_exact_probability_for_laws_with_ties()
    {
        int seen = 0;
        foreach (var law in ThreePoints.Laws())
        {
            foreach (int trials in new[] { 1, 2, 3, 5, 8, 13, 21, 30 })
            {
                double[] distances = [.. Enumerable.Range(1, 15).Select(i => 0.05 * i)];
                var (one, either) = Straying(law, trials, distances);
                for (int i = 0; i < distances.Length; i++)
                {
                    Assert.True(one[i] <= Massart.Tail(trials, distances[i]).Upper * (1 + 1e-12), $"{law} {trials}");
                    Assert.True(
                        either[i] <= Massart.EitherTail(trials, distances[i]).Upper * (1 + 1e-12), $"{law} {trials}");
                    seen++;
                }
            }
        }

        Assert.Equal(12_000, seen);
    }

    static (double[] One, double[] Either) Straying(ThreePoints law, int trials, double[] distances)
    {
        var (one, either) = (new double[distances.Length], new double[distances.Length]);
        // In the order of the points.
        int[] order = [.. Enumerable.Range(0, 3).OrderBy(i => law.Points[i])];
        for (int first = 0; first <= trials; first++)
        {
            for (int second = 0; first + second <= trials; second++)
            {
                int[] counts = [first, second, trials - first - second];
                double low = counts[order[0]] / (double)trials - law.Masses[order[0]];
                double high = law.Masses[order[2]] - counts[order[2]] / (double)trials;
                double above = Math.Max(0, Math.Max(low, high)), below = Math.Max(0, Math.Max(-low, -high));
                double mass = law.Mass(trials, first, second);
                for (int i = 0; i < distances.Length; i++)
                {
                    one[i] += above > distances[i] ? mass : 0;
                    either[i] += Math.Max(above, below) > distances[i] ? mass : 0;
                }
            }
        }

        return (one, either);
    }

    [Fact]
    public void It_agrees_with_eighty_digits_and_covers_the_exact_probability()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("kolmogorov_exact"))
        {
            var (n, d) = (row.Whole("n"), row.Number("d"));
            double bound = Massart.EitherTail(n, d).Upper, formula = Math.Min(1, row.Number("dkw_massart_bound"));
            Assert.True(bound >= formula && (formula < 1e-299 || bound <= formula * (1 + Accuracy)), $"{row}: {bound:R}");
            Assert.True(bound >= row.Number("complement") * (1 - 1e-12), $"{row}: {bound:R}");
            Assert.True(Massart.Tail(n, d).Upper >= row.Number("p_dplus_ge_d") * (1 - 1e-12), $"{row}");
            seen++;
        }

        Assert.Equal(55, seen);
    }

    [Fact]
    public void Radii_agree_with_eighty_digits_and_trials_undo_them()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("bound_radius"))
        {
            double radius = Massart.EitherRadius(row.Whole("n"), row.Number("alpha"));
            Assert.InRange(radius / row.Number("eps_dkw_two_sided"), 1, 1 + 2e-12);
            if (radius <= 1)
                Assert.InRange(
                    Massart.EitherTrialsNeeded(radius, row.Number("alpha"))!.Value, row.Whole("n") - 1, row.Whole("n") + 1);
            seen++;
        }

        Assert.Equal(120, seen);
    }

    [Theory]
    [InlineData(0.05, 1e-9)]
    [InlineData(1, 0.5)]
    [InlineData(1e-6, 1e-3)]
    public void Trials_needed_are_the_first_that_suffice(double distance, double risk)
    {
        long needed = Massart.EitherTrialsNeeded(distance, risk)!.Value;

        Assert.True(Massart.EitherTail(needed, distance).Upper <= risk);
        Assert.True(needed == 1 || Massart.EitherTail(needed - 1, distance).Upper > risk);
        Assert.Null(Massart.EitherTrialsNeeded(1e-9, risk));
    }

    [Fact]
    public void Its_page_states_how_far_above_the_exact_probability_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| trials | distance | exact, either side | bound | ratio |\n| --: | --: | --: | --: | --: |\n");
        foreach (var (trials, distance) in new[] { (10L, 0.4), (10, 0.8), (100, 0.1), (100, 0.3), (1_000, 0.05), (1_000, 0.1), (2_000, 0.05) })
        {
            double exact = KolmogorovTail.TwoSided(trials, distance).Upper;
            double bound = Massart.EitherTail(trials, distance).Upper;
            text.Append(CultureInfo.InvariantCulture,
                $"| {trials:N0} | {distance} | {exact:0.000e+0} | {bound:0.000e+0} | {bound / exact:0.00} |\n");
        }

        Repository.MustContain("src/docs/tails/Massart.md", "measured", text.ToString());
    }

    [Fact]
    public void Ends_of_the_domain_are_safe()
    {
        Assert.Equal(new Enclosure(0, 1), Massart.Tail(5, 0));
        Assert.Equal(new Enclosure(0, 1), Massart.EitherTail(1, 0.5));
        Assert.Equal(2e-300, Massart.EitherTail(1_000_000_000, 1).Upper);
        Assert.InRange(Massart.EitherTail(1_000_000_000, 1e-4).Upper / (2 * Math.Exp(-20)), 1, 1 + Accuracy);
        Assert.Equal(new Enclosure(0, 1), Massart.Tail(100, Math.Sqrt(Math.Log(2) / 200) * (1 - 1e-9)));
        Assert.InRange(Massart.Tail(100, Math.Sqrt(Math.Log(2) / 200) * (1 + 1e-9)).Upper, 0.49, 0.5);
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double distance in new[] { -0.1, 1.1, double.NaN })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => Massart.Tail(5, distance));
            Assert.Throws<ArgumentOutOfRangeException>(() => Massart.EitherTail(5, distance));
            Assert.Throws<ArgumentOutOfRangeException>(() => Massart.EitherTrialsNeeded(distance, 0.1));
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => Massart.EitherTail(0, 0.1));
        foreach (double risk in new[] { 0, 1, double.NaN })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => Massart.EitherRadius(5, risk));
            Assert.Throws<ArgumentOutOfRangeException>(() => Massart.EitherTrialsNeeded(0.1, risk));
        }
    }
}
