namespace Assize.Bounds.Tests.Plans;

public class DistributionPlanTests
{
    // (√ln(2/risk) + √ln(1/miss))²/(2·(defect - tolerance)²) for one source, by hand; for two (√ln(2/risk) + √ln(1/miss))²/gap².
    [Theory]
    [InlineData(0, 0.05, 10_531)]
    [InlineData(0.01, 0.02, 263_252)]
    public void One_look_at_one_source_takes_the_trials_of_both_inequalities(double tolerance, double defect, long trials) =>
        Assert.Equal(trials, DistributionPlan.For(tolerance, defect, 1e-9, 0.999).FixedTrials);

    [Fact]
    public void Two_sources_take_twice_as_many_or_more()
    {
        Assert.Equal(21_061, DistributionPlan.ForPair(0, 0.05, 1e-9, 0.999).FixedTrials, 1.0);
        Assert.True(DistributionPlan.ForPair(0.01, 0.06, 1e-9, 0.999).FixedTrials > 21_061);
    }

    // Published by simulation elsewhere: the last look of these numbers comes at trial 5,106.
    [Fact]
    public void Looks_grow_by_a_fifth_to_the_last()
    {
        var looks = DistributionPlan.For(0.05, 0.1, 0.05, 0.95).Looks;

        Assert.Equal(5_106, looks[^1]);
        Assert.All(looks.Zip(looks.Skip(1)), pair => Assert.InRange((double)pair.Second / pair.First, 1.18, 1.21));
    }

    [Theory]
    [InlineData(0, 0.05)]
    [InlineData(0.05, 0.1)]
    [InlineData(0.4, 0.9)]
    public void The_last_look_always_decides_and_the_margins_are_those_of_the_inequalities(double tolerance, double defect)
    {
        foreach (var plan in (DistributionPlan[])[DistributionPlan.For(tolerance, defect, 1e-6, 0.99), DistributionPlan.ForPair(tolerance, defect, 1e-6, 0.99)])
        {
            bool isPair = plan.Theorem.Contains("each source", StringComparison.Ordinal) || plan.Theorem.StartsWith("Wei", StringComparison.Ordinal);
            double looks = plan.Looks.Count;
            foreach (long n in plan.Looks)
            {
                for (double distance = 0; distance <= 1; distance += 1 / 1024.0)
                {
                    double over = distance - tolerance, under = defect - distance;
                    double red = !isPair ? 2 * Math.Exp(-2 * n * over * over) : tolerance == 0 ? 2 * Math.Exp(-n * over * over) : 4 * Math.Exp(-n * over * over / 2);
                    double green = Math.Exp(-(isPair ? 1 : 2) * n * under * under);
                    bool refutes = plan.Refutes(n, distance), upholds = plan.Upholds(n, distance) && !refutes;
                    Assert.True(!refutes || (over > 0 && red <= 1e-6 / looks), $"red at {n}, {distance}");
                    Assert.True(!upholds || (under > 0 && green <= 0.01 / looks * (1 + 1e-9)), $"green at {n}, {distance}");
                    Assert.True(n < plan.Looks[^1] || refutes || upholds);
                }
            }
        }
    }

    [Theory]
    [InlineData(0, 0, 1e-9, 0.999)]
    [InlineData(0.1, 0.05, 1e-9, 0.999)]
    [InlineData(double.NaN, 0.05, 1e-9, 0.999)]
    [InlineData(0.1, 1.5, 1e-9, 0.999)]
    [InlineData(0.1, 0.2, 0, 0.999)]
    [InlineData(1e-5, 2e-5, 1e-9, 0.999)]
    public void Bad_numbers_are_refused(double tolerance, double defect, double risk, double confidence) =>
        Assert.Throws<ClaimRefusedException>(() => DistributionPlan.For(tolerance, defect, risk, confidence));

    [Fact]
    public void Fewer_trials_than_one_look_needs_are_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => DistributionPlan.For(0.05, 0.1, 1e-9, 0.999) is var plan ? plan.Once(plan.FixedTrials - 1) : null);
}
