namespace Assize.Bounds.Tests.Plans;

public class ManyRatesPlanTests
{
    static readonly Edges[] Docks = [.. new[] { 0.5, 0.3, 0.2 }.Select(share => Edges.Around(Domain.Rate, share, 0.05))];

    // Masses by repeated convolution: no tail, no gamma function.
    static double[] Masses(long trials, double rate)
    {
        double[] masses = [1];
        for (long trial = 0; trial < trials; trial++)
        {
            double[] next = new double[masses.Length + 1];
            for (int count = 0; count < masses.Length; count++)
            {
                next[count] += masses[count] * (1 - rate);
                next[count + 1] += masses[count] * rate;
            }

            masses = next;
        }

        return masses;
    }

    static double Outside(long trials, double rate, (long Low, long High) limits) =>
        Masses(trials, rate).Where((_, count) => count < limits.Low || count > limits.High).Sum();

    [Theory]
    [InlineData(1e-3, 0.99)]
    [InlineData(0.05, 0.9)]
    public void Both_errors_are_bounded_at_the_plan_and_beyond(double risk, double confidence)
    {
        var plan = ManyRatesPlan.For(Docks, risk, confidence);
        foreach (long trials in (long[])[plan.Trials, plan.Trials + 1, plan.Trials + 17])
        {
            var limits = plan.LimitsAt(trials);
            double red = 0;
            for (int i = 0; i < Docks.Length; i++)
            {
                var limit = limits[plan.KindOf[i]];
                red += Math.Max(Outside(trials, Docks[i].UpperEdge!.Value, limit), Outside(trials, Docks[i].LowerEdge!.Value, limit));
                Assert.True(1 - Outside(trials, Docks[i].UpperDefect!.Value, limit) <= plan.Miss * (1 + 1e-9), $"{i} above");
                Assert.True(1 - Outside(trials, Docks[i].LowerDefect!.Value, limit) <= plan.Miss * (1 + 1e-9), $"{i} below");
            }

            Assert.InRange(red, risk / 20, risk);
        }
    }

    [Fact]
    public void One_rate_has_its_own_plan()
    {
        var edges = Edges.Around(Domain.Rate, 0.3, 0.01);

        Assert.Equal(RatePlan.For(edges, 1e-9, 0.999).Trials, ManyRatesPlan.For([edges], 1e-9, 0.999).Trials);
        Assert.Equal(RatePlan.For(edges, 5e-10, 0.999).Trials, ManyRatesPlan.For([edges, edges], 1e-9, 0.999).Trials);
    }

    [Fact]
    public void A_share_of_both_errors_takes_more_trials_and_more_rates_do_too()
    {
        var plan = ManyRatesPlan.For(Docks, 1e-9, 0.999);

        Assert.True(plan.Share(0.1).Trials > plan.Trials);
        Assert.Equal(1e-10, plan.Share(0.1).Risk, 1e-24);
        Assert.Equal(1e-4, plan.Share(0.1).Miss, 1e-18);
        Assert.True(ManyRatesPlan.For([.. Docks, .. Docks, .. Docks], 1e-9, 0.999).Trials > plan.Trials);
    }

    [Fact]
    public void Hundreds_of_different_rates_have_a_plan_that_is_large_enough()
    {
        Edges[] rates = [.. Enumerable.Range(1, 300).Select(i => Edges.Around(Domain.Rate, i / 400.0, 0.02))];
        var plan = ManyRatesPlan.For(rates, 1e-6, 0.99);

        foreach (int i in (int[])[0, 60, 199, 299])
            Assert.True(plan.Trials >= RatePlan.For(rates[i], 1e-6 * 2 / plan.Sides, 0.99).Trials);
    }

    [Theory]
    [InlineData(0, 0.999)]
    [InlineData(1e-9, double.NaN)]
    [InlineData(0.9, 0.5)]
    public void Bad_numbers_are_refused(double risk, double confidence) =>
        Assert.Throws<ClaimRefusedException>(() => ManyRatesPlan.For(Docks, risk, confidence));

    [Fact]
    public void No_rate_at_all_is_refused() => Assert.Throws<ClaimRefusedException>(() => ManyRatesPlan.For([], 1e-9, 0.999));
}
