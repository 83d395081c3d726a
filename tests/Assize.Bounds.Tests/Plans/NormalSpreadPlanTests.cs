using MathNet.Numerics.Distributions;

namespace Assize.Bounds.Tests.Plans;

public class NormalSpreadPlanTests
{
    // MathNet.Numerics has its own incomplete gamma function: both errors recomputed with it at the plan and beyond it.
    [Theory]
    [InlineData(1, 0.1, 0.3, 1e-3, 0.99)]
    [InlineData(1, 0, 0.1, 1e-6, 0.999)]
    [InlineData(5, 1, 2, 1e-4, 0.9)]
    [InlineData(2, 1.5, 1.9, 1e-3, 0.99)]
    public void Both_errors_are_kept_and_one_trial_fewer_breaks_one(double target, double tolerance, double defect, double risk, double confidence)
    {
        var edges = Edges.Around(new Domain(0, double.PositiveInfinity), target, tolerance, defect);
        var plan = NormalSpreadPlan.For(edges, risk, confidence);

        foreach (long trials in (long[])[plan.Trials, plan.Trials + 1, 2 * plan.Trials])
        {
            var (red, missed) = Errors(plan, trials);
            Assert.True(red <= risk && missed <= 1 - confidence, $"{trials} trials: {red}, {missed}");
        }

        Assert.True(Errors(plan, plan.Trials - 1).Missed > (1 - confidence) * (1 - 1e-6));
    }

    static (double Red, double Missed) Errors(NormalSpreadPlan plan, long trials)
    {
        var (low, high) = plan.LimitsAt(trials);
        var edges = plan.Edges;
        double Green(double deviation) =>
            ChiSquared.CDF(trials - 1, high / (deviation * deviation)) - ChiSquared.CDF(trials - 1, low / (deviation * deviation));
        double red = Math.Max(1 - Green(edges.UpperEdge!.Value), 1 - Green(edges.LowerEdge!.Value));
        return (red, Math.Max(Green(edges.UpperDefect!.Value), Green(edges.LowerDefect!.Value)));
    }

    [Fact]
    public void Edges_of_another_quantity_and_hopeless_plans_are_refused()
    {
        Assert.Throws<ClaimRefusedException>(() => NormalSpreadPlan.For(Edges.Around(Domain.Any, 1, 0.1), 1e-9, 0.999));
        Assert.Throws<ClaimRefusedException>(() => NormalSpreadPlan.For(Edges.AtMost(new Domain(0, 10), 1, 1e-9), 1e-9, 0.999));
    }
}
