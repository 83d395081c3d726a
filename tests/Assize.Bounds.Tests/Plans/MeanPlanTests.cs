namespace Assize.Bounds.Tests.Plans;

public class MeanPlanTests
{
    // W. Hoeffding 1963 with two errors, in closed form: ⌈R²(√ln(2/α) + √ln(1/β))²/(2·defect²)⌉ is 263,252 for a die at 1e-9
    // and 0.999; the divergence form the plan takes can only need fewer.
    [Fact]
    public void A_die_takes_no_more_than_Hoeffdings_closed_form()
    {
        var plan = MeanPlan.For(Edges.Around(new Domain(1, 6), 3.5, 0, 0.05), MeanFacts.None.Between(1, 6), 1e-9, 0.999);

        Assert.InRange(plan.Theorems.Single(theorem => theorem.Name == "Hoeffding").Trials!.Value, 250_000, 263_252);
        Assert.True(plan.Trials <= 263_252);
    }

    // O. Catoni 2012 with two errors: ⌈2(2σ²/d² + 1)(ln(2/α) + ln(1/β))⌉ for σ = 1, d = 0.05, β = 0.001, recomputed by hand.
    [Theory]
    [InlineData(1e-2, 19_555)]
    [InlineData(1e-4, 26_932)]
    [InlineData(1e-6, 34_310)]
    [InlineData(1e-9, 45_376)]
    public void Bounded_deviation_takes_Catonis_number(double risk, long trials)
    {
        var plan = MeanPlan.For(Edges.Around(Domain.Any, 0, 0, 0.05), MeanFacts.None.DeviatingAtMost(1), risk, 0.999);

        Assert.Equal((trials, "Catoni", true), (plan.Trials, plan.Theorem, plan.IsByInfluence));
    }

    // Two errors of a normal mean with a sub-Gaussian proxy: n = 2σ²(√ln(2/α) + √ln(1/β))²/d².
    [Fact]
    public void Sub_gaussian_draws_take_the_closed_form()
    {
        var plan = MeanPlan.For(Edges.Around(Domain.Any, 0, 0, 0.2), MeanFacts.None.SubGaussian(1), 1e-9, 0.999);
        double roots = Math.Sqrt(Math.Log(2e9)) + Math.Sqrt(Math.Log(1000));

        Assert.Equal(Math.Ceiling(2 * roots * roots / 0.04), plan.Trials);
    }

    /// <summary>On laws of two points the average is a count: both errors are binomial tails in whole numbers, which share no
    /// formula with the plan.</summary>
    [Fact]
    public void Both_errors_are_kept_on_laws_of_two_points()
    {
        int cases = 0;
        foreach (var (edges, facts) in Claims())
        {
            var plan = MeanPlan.For(edges, facts, 0.05, 0.9);
            Assert.True(plan.Trials < 2_000);
            foreach (long trials in (long[])[plan.Trials, plan.Trials + 1, plan.Trials + 37])
            {
                Assert.True(plan.IsByInfluence || plan.LimitsAt(trials).MeetsBoth);
                foreach (var (truth, allowed, isRed) in Truths(edges))
                    cases += Keeps(plan, trials, truth, allowed, isRed);
            }
        }

        Assert.True(cases > 300, $"{cases} cases");
    }

    // Every law: the low value as the facts allow, the high one so that the deviation is met.
    static int Keeps(MeanPlan plan, long trials, double truth, double allowed, bool isRed)
    {
        int cases = 0;
        foreach (double rate in (double[])[0.5, 0.125, 0.875, 1 / 32.0, 31 / 32.0])
        {
            if (TwoPoints(plan.Facts, truth, rate) is not var (low, high))
                continue;

            var count = new ExactBinomial((int)trials, rate);
            long first = -1, last = -2;
            for (long successes = 0; successes <= trials; successes++)
            {
                if (IsRed(plan, trials, successes, low, high))
                    continue;
                first = first < 0 ? successes : first;
                last = successes;
            }

            // Green lies in one run of counts.
            int sign = isRed ? count.CompareBetween(first, last, allowed) : count.CompareOutside(first, last, allowed);
            Assert.True(sign <= 0, $"truth {truth} rate {rate} trials {trials}");
            cases++;
        }

        return cases;
    }

    static bool IsRed(MeanPlan plan, long trials, long successes, double low, double high)
    {
        if (!plan.IsByInfluence)
            return !plan.LimitsAt(trials).Accept((successes * high + (trials - successes) * low) / trials);

        double Sum(Func<double, double> deviation) =>
            successes * plan.InfluenceOf(deviation(high)) + (trials - successes) * plan.InfluenceOf(deviation(low));
        double limit = plan.InfluenceLimitAt(trials);
        return (plan.Edges.UpperEdge is { } upper && Sum(draw => draw - upper) >= limit)
            || (plan.Edges.LowerEdge is { } lower && Sum(draw => lower - draw) >= limit);
    }

    static (double Low, double High)? TwoPoints(MeanFacts facts, double mean, double rate)
    {
        double deviation = facts.StandardDeviation ?? double.MaxValue;
        if (facts is { Minimum: { } minimum, Maximum: { } maximum })
            deviation = Math.Min(deviation, Math.Min((mean - minimum) / Math.Sqrt(rate / (1 - rate)), (maximum - mean) / Math.Sqrt((1 - rate) / rate)));
        if (facts.Proxy is not null && rate != 0.5)
            return null;

        return (mean - deviation * Math.Sqrt(rate / (1 - rate)), mean + deviation * Math.Sqrt((1 - rate) / rate));
    }

    static IEnumerable<(Edges Edges, MeanFacts Facts)> Claims()
    {
        var unit = new Domain(0, 1);
        foreach (double target in (double[])[0.2, 0.5, 0.8])
        {
            yield return (Edges.Around(unit, target, 0, 0.15), MeanFacts.None.Between(0, 1));
            yield return (Edges.Around(unit, target, 0.05, 0.15), MeanFacts.None.Between(0, 1).DeviatingAtMost(0.2));
            yield return (Edges.AtMost(unit, target, 0.1), MeanFacts.None.Between(0, 1));
            yield return (Edges.AtLeast(unit, target, 0.1), MeanFacts.None.Between(0, 1).DeviatingAtMost(0.3));
        }

        yield return (Edges.Around(Domain.Any, 0, 0.1, 0.4), MeanFacts.None.DeviatingAtMost(1));
        yield return (Edges.AtMost(Domain.Any, 3, 0.3), MeanFacts.None.DeviatingAtMost(1));
        yield return (Edges.Around(Domain.Any, 0, 0, 0.3), MeanFacts.None.SubGaussian(1));
    }

    static IEnumerable<(double Truth, double Allowed, bool IsRed)> Truths(Edges edges)
    {
        yield return (edges.Target, 0.05, false);
        if (edges.UpperEdge is { } upper)
            yield return (upper, 0.05, false);
        if (edges.LowerEdge is { } lower)
            yield return (lower, 0.05, false);
        if (edges.UpperDefect is { } above)
            yield return (above, 0.1, true);
        if (edges.LowerDefect is { } below)
            yield return (below, 0.1, true);
    }

    [Fact]
    public void A_mean_without_facts_is_refused_and_told_what_helps()
    {
        var refusal = Assert.Throws<ClaimRefusedException>(() => MeanPlan.For(Edges.Around(Domain.Any, 0, 0.1), MeanFacts.None, 1e-9, 0.999));

        Assert.Contains("Say between which values draws lie, or how large their standard deviation can be.", refusal.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void More_than_1e15_trials_are_refused() => Assert.Contains(
        "1e15 trials",
        Assert.Throws<ClaimRefusedException>(() => MeanPlan.For(Edges.Around(Domain.Any, 0, 0, 1e-8), MeanFacts.None.DeviatingAtMost(1), 1e-9, 0.999)).Message,
        StringComparison.Ordinal);
}
