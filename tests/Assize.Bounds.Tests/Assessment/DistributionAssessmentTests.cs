namespace Assize.Bounds.Tests.Assessment;

public class DistributionAssessmentTests
{
    // G. Marsaglia, W. W. Tsang, J. Wang, J. Stat. Softw. 8 (2003) 18: K(10, .274) and K(100, .1), recomputed at 40 digits.
    [Theory]
    [InlineData(10, 0.274, 1 - 0.628479615456504275)]
    [InlineData(100, 0.1, 1 - 0.747307242993609873)]
    public void The_distance_is_Kolmogorovs(long trials, double distance, double red) =>
        Enumerated.Contains(new DistributionAssessment(trials, distance).FalseFailure, red, $"{trials} draws within {distance}");

    [Fact]
    public void Trials_needed_and_the_distance_affordable_are_enough()
    {
        long needed = new DistributionAssessment(100, 0.1).TrialsNeeded(1e-6)!.Value;
        Assert.True(new DistributionAssessment(needed, 0.1).FalseFailure.Upper <= 1e-6);

        double distance = new DistributionAssessment(500, 0.1).ToleranceAffordable(1e-4)!.Value;
        Assert.InRange(new DistributionAssessment(500, distance).FalseFailure.Upper, 0.3e-4, 1e-4);
        Assert.Throws<ArgumentOutOfRangeException>(() => new DistributionAssessment(10, 0));
    }
}
