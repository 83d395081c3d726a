namespace Assize.Bounds.Tests;

/// <summary>The three monotonicities on which the search for a plan rests, looked for over a grid.</summary>
public class RateSideTests
{
    static readonly (bool Upper, double Edge, double Defect)[] Sides =
        [(true, 0.5, 0.6), (true, 0.02, 0.05), (true, 0.93, 0.99), (false, 0.5, 0.4), (false, 0.1, 0.03), (false, 0.97, 0.9)];

    [Fact]
    public void The_smoothed_miss_never_rises_as_trials_are_added()
    {
        int seen = 0, sawteeth = 0;
        foreach (var (upper, edge, defect) in Sides)
        {
            var side = new RateSide(upper, edge, defect, 0.01);
            double previous = 1;
            double plain = 1;
            for (int trials = 1; trials <= 600; trials++)
            {
                double smoothed = side.SmoothedMiss(trials, 0.01);
                double missed = side.Missed(trials, side.Limit(trials));
                Assert.True(
                    smoothed <= previous * (1 + 1e-10), $"{upper} {edge} {trials}: {smoothed:R} after {previous:R}");
                Assert.True(smoothed <= missed * (1 + 1e-10));
                sawteeth += missed > plain ? 1 : 0;
                (previous, plain) = (smoothed, missed);
                seen++;
            }
        }

        Assert.Equal(3600, seen);
        Assert.True(sawteeth > 100, $"the plain miss rose {sawteeth} times");
    }

    [Fact]
    public void The_hazard_grows_with_the_limit_and_falls_with_the_trials_and_grows_along_a_distance()
    {
        int seen = 0;
        foreach (var (upper, edge, defect) in Sides)
        {
            var side = new RateSide(upper, edge, defect, 0.01);
            for (int trials = 10; trials <= 200; trials += 19)
            {
                for (long limit = side.Limit(trials); limit < trials; limit += 2)
                {
                    double hazard = side.Hazard(trials, limit) * (1 - 1e-10);
                    Assert.True(hazard <= side.Hazard(trials, limit + 1), $"{edge} {trials} {limit}");
                    Assert.True(
                        side.Hazard(trials + 1, limit) * (1 - 1e-10) <= side.Hazard(trials, limit),
                        $"{edge} {trials} {limit}");
                    Assert.True(hazard <= side.Hazard(trials + 1, limit + 1), $"{edge} {trials} {limit}");
                    seen++;
                }
            }
        }

        Assert.True(seen > 1000, $"only {seen} limits");
    }

    [Fact]
    public void The_limit_is_the_smallest_that_keeps_the_risk()
    {
        int seen = 0;
        foreach (var (upper, edge, defect) in Sides)
        {
            foreach (double risk in new[] { 0.4, 0.01, 1e-9 })
            {
                var side = new RateSide(upper, edge, defect, risk);
                foreach (int trials in new[] { 1, 5, 50, 170 })
                {
                    long limit = side.Limit(trials);
                    var exact = new ExactBinomial(trials, edge);
                    int Beyond(long most) => upper ? exact.CompareAtLeast(most + 1, risk) : exact.CompareAtMost(trials - most - 1, risk);
                    Assert.True(Beyond(limit) <= 0, $"{edge} {risk} {trials} {limit}");
                    Assert.True(limit == 0 || Beyond(limit - 1) > 0, $"{edge} {risk} {trials} {limit}");
                    seen++;
                }
            }
        }

        Assert.Equal(72, seen);
    }
}
