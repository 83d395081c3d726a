using System.Globalization;
using Assize.Testing;

namespace Assize.Bounds.Tests;

public class CatoniTests
{
    // The accuracy its page states.
    const double Accuracy = 1e-11;

    [Fact]
    public void Sums_of_influences_pass_their_limits_no_more_often_than_promised()
    {
        int seen = 0;
        double worst = 0;
        foreach (var draws in ThreePoints.Laws())
        {
            foreach (int trials in new[] { 1, 2, 5, 12, 30 })
            {
                foreach (double margin in new[] { 0.05, 0.2, 0.5, 1, 2, 7 })
                {
                    foreach (int sign in new[] { 1, -1 })
                    {
                        double scale = Catoni.CentreScale(draws.Deviation, margin * draws.Deviation);
                        double centre = sign * margin * draws.Deviation;
                        double passed = draws.Probability(
                            trials, value => Catoni.Influence(scale * sign * (value - centre)), sum => sum >= 0);
                        double tail = Catoni.Tail(trials, draws.Deviation, margin * draws.Deviation).Upper;
                        Assert.True(passed <= tail, $"{draws} {trials} {margin}: {passed} against {tail}");
                        worst = Math.Max(worst, passed / tail);
                        seen++;

                        double risk = 0.3 / (1 + margin * 10);
                        double limit = Catoni.Limit(trials, draws.Deviation, scale, risk);
                        passed = draws.Probability(
                            trials, value => Catoni.Influence(scale * sign * value), sum => sum >= limit);
                        Assert.True(passed <= risk, $"{draws} {trials} {margin}: {passed} against {risk}");
                        seen++;
                    }
                }
            }
        }

        Assert.True(seen > 10_000, $"only {seen} cases");
        Assert.InRange(worst, 0.5, 1);
    }

    [Fact]
    public void The_number_for_both_errors_catches_a_defect_a_gap_away()
    {
        int seen = 0;
        double worst = 0;
        foreach (var draws in ThreePoints.Laws())
        {
            foreach (double gap in new[] { 2.0, 5.0 })
            {
                foreach (double miss in new[] { 0.3, 0.1, 0.02 })
                {
                    double distance = gap * draws.Deviation;
                    int trials = (int)Catoni.TrialsNeeded(draws.Deviation, distance, 0.2, miss)!.Value;
                    double scale = Catoni.Scale(draws.Deviation, distance);
                    double limit = Catoni.Limit(trials, draws.Deviation, scale, 0.2);
                    double green = draws.Probability(
                        trials, value => Catoni.Influence(scale * (value + distance)), sum => sum < limit);
                    Assert.True(green <= miss, $"{draws} {gap} {miss}: {green}");
                    worst = Math.Max(worst, green / miss);
                    seen++;
                }
            }
        }

        Assert.Equal(600, seen);
        Assert.True(worst > 0.03, $"{worst}");
    }

    // σ = 1, margin 0.05, both sides at the risk: ⌈2 ln(2/risk)(1 + 400)⌉; computed elsewhere.
    [Theory]
    [InlineData(1e-2, 4_250)]
    [InlineData(1e-4, 7_943)]
    [InlineData(1e-6, 11_636)]
    [InlineData(1e-9, 17_176)]
    public void Trials_needed_are_the_first_that_suffice(double risk, long trials)
    {
        Assert.Equal(trials, Catoni.TrialsNeeded(1, 0.05, risk / 2));
        Assert.True(Catoni.Tail(trials, 1, 0.05).Upper <= risk / 2);
        Assert.True(Catoni.Tail(trials - 1, 1, 0.05).Upper > risk / 2);
    }

    // σ = 1, gap 0.05, miss 1e-3; computed elsewhere.
    [Theory]
    [InlineData(1e-2, 19_555)]
    [InlineData(1e-4, 26_932)]
    [InlineData(1e-6, 34_310)]
    [InlineData(1e-9, 45_376)]
    public void Both_errors_take_the_trials_computed_elsewhere(double risk, long trials) =>
        Assert.Equal(trials, Catoni.TrialsNeeded(1, 0.05, risk / 2, 1e-3));

    // ln(1 + x + x²/2) at 60 digits (mpmath 1.3.0).
    [Theory]
    [InlineData(1e-12, 1e-12)]
    [InlineData(0.5, 0.4855078157817008)]
    [InlineData(3, 2.140066163496271)]
    [InlineData(1e8, 36.148214327344786)]
    [InlineData(1e120, 551.9272751380110)]
    public void The_influence_is_odd_and_follows_its_formula(double deviation, double influence)
    {
        Assert.Equal(1, Catoni.Influence(deviation) / influence, 1e-13);
        Assert.Equal(-Catoni.Influence(deviation), Catoni.Influence(-deviation));
    }

    [Fact]
    public void The_influence_lies_between_the_two_logarithms_its_proof_needs()
    {
        int seen = 0;
        for (double y = -60; y <= 60; y += 0.0097)
        {
            double most = Math.Log(1 + y + y * y / 2);
            double least = -Math.Log(1 - y + y * y / 2);
            Assert.InRange(Catoni.Influence(y), least - 1e-14, most + 1e-14);
            seen++;
        }

        Assert.True(seen > 12_000);
        Assert.True(Catoni.Influence(1e308) > Catoni.Influence(1e307));
        Assert.Equal(double.NegativeInfinity, Catoni.Influence(double.NegativeInfinity));
    }

    [Fact]
    public void Its_page_states_how_far_above_the_formula_it_is()
    {
        var table = new AccuracyTable("Catoni", Accuracy);
        var rows = ReferenceTable.Rows("spread_facts").ToArray();
        table.Tails("scattered tails in 120 digits", rows.Select(row => (
            row.Number("ln_catoni"),
            Catoni.Tail(row.Whole("n"), row.Number("deviation"), row.Number("margin")))));

        // Near n = 2L a rounded logarithm moves the margin by more.
        var many = rows.Where(row => row.Whole("n") > -8 * Math.Log(row.Number("risk")));
        table.Margins("scattered margins in 120 digits", many.Select(row => (
            row.Number("r_catoni"),
            Catoni.Radius(row.Whole("n"), row.Number("deviation"), row.Number("risk")))));
        table.MustStand();
    }

    [Theory]
    [InlineData(30, 1, 0.1)]
    [InlineData(1000, 2, 1e-9)]
    [InlineData(1_000_000_000, 1e150, 1e-300)]
    [InlineData(100_000, 1e-150, 1e-300)]
    public void The_radius_undoes_the_tail_on_the_safe_side(long trials, double deviation, double risk)
    {
        double radius = Catoni.Radius(trials, deviation, risk);
        double wanted = -Math.Log(risk);

        Assert.Equal(1, radius / (deviation * Math.Sqrt(2 * wanted / (trials - 2 * wanted))), Accuracy);
        Assert.InRange(Catoni.Tail(trials, deviation, radius).Upper / risk, 1 - 2e-9, 1 + Accuracy);
    }

    [Fact]
    public void Too_few_values_have_no_radius() =>
        Assert.Equal(
            (double.PositiveInfinity, double.PositiveInfinity), (Catoni.Radius(41, 1, 1e-9), Catoni.Radius(1, 1, 0.5)));

    [Fact]
    public void A_margin_too_small_for_any_machine_has_no_number()
    {
        Assert.Null(Catoni.TrialsNeeded(1, 1e-7, 1e-9));
        Assert.Null(Catoni.TrialsNeeded(1, 1e-150, 1e-9, 1e-3));
    }

    [Fact]
    public void Its_page_states_how_many_trials_it_takes()
    {
        var text = new System.Text.StringBuilder(
            "| risk | Catoni, any law of this deviation | an exponential law's average, exactly | Chebyshev |\n");
        text.Append("| --: | --: | --: | --: |\n");
        foreach (var (risk, exact) in new[] { (1e-2, 2_655), (1e-4, 6_071), (1e-6, 9_620), (1e-9, 15_056) })
        {
            long needed = Catoni.TrialsNeeded(1, 0.05, risk / 2)!.Value;
            text.Append(CultureInfo.InvariantCulture, $"| {risk:0e+0} | {needed:N0} | {exact:N0} ");
            text.Append(CultureInfo.InvariantCulture, $"| {400 / risk:N0} |\n");
        }

        Repository.MustContain("src/docs/tails/Catoni.md", "measured", text.ToString());
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Influence(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Tail(0, 1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Tail(5, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Tail(5, 1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Radius(5, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Radius(5, 1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.TrialsNeeded(1, 0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.TrialsNeeded(1, 0.1, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.TrialsNeeded(1, 0.1, 0.1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Limit(5, 1, double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Limit(5, 1, 1, 2));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.Scale(1, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Catoni.CentreScale(1, 0));
    }
}
