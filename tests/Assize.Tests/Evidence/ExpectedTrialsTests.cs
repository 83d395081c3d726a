using Assize.Bounds;

namespace Assize.Tests.Evidence;

/// <summary>The estimates, against the exact means of the same race.</summary>
public class ExpectedTrialsTests
{
    // The documented accuracy, relative.
    const double Accuracy = 0.01;

    [Theory]
    [InlineData(.5, 0, .1, 1e-9, .999)]
    [InlineData(.5, .05, .1, .05, .95)]
    [InlineData(.5, .2, .4, 1e-9, .999)]
    [InlineData(.75, .05, .1, 1e-9, .999)]
    [InlineData(.1, .01, .03, 1e-9, .999)]
    [InlineData(.9, .02, .05, 1e-6, .99)]
    [InlineData(.9, .02, .05, 1e-9, .999)]
    [InlineData(.02, .01, .02, 1e-9, .999)]
    public void Estimates_of_two_sided_races_are_within_one_percent(
        double target, double tolerance, double defect, double risk, double confidence) =>
        AreWithin(Edges.Around(Domain.Rate, target, tolerance, defect), risk, confidence);

    [Theory]
    [InlineData(.01, .01, 1e-9, .999)]
    [InlineData(.001, .001, 1e-9, .999)]
    [InlineData(0, .001, 1e-9, .999)]
    [InlineData(.5, .02, 1e-6, .999)]
    public void Estimates_of_races_of_at_most_are_within_one_percent(
        double target, double defect, double risk, double confidence) =>
        AreWithin(Edges.AtMost(Domain.Rate, target, defect), risk, confidence);

    // The exact means of the long races, of the table in RateRaceTests.
    [Theory]
    [InlineData(.5, 0, .01, 48_625, 48_625, 110_869)]
    [InlineData(.5, .005, .01, 50_868, 148_141, double.NaN)]
    [InlineData(.01, .0025, .005, 8_483, double.NaN, double.NaN)]
    public void Estimates_of_long_races_are_within_one_percent(
        double target, double tolerance, double defect, double atTarget, double atTolerance, double atDefect)
    {
        var edges = Edges.Around(Domain.Rate, target, tolerance, defect);
        var expected = ExpectedTrials.Of(RateStakes.Of(RatePlan.For(edges, 1e-9, .999)));

        IsWithin(atTarget, expected.AtTarget);
        IsWithin(atTolerance, expected.AtTolerance);
        IsWithin(atDefect, expected.AtDefect);
    }

    static void AreWithin(Edges edges, double risk, double confidence)
    {
        var stakes = RateStakes.Of(RatePlan.For(edges, risk, confidence));
        var expected = ExpectedTrials.Of(stakes);
        double Exact(params double?[] truths) => truths.Max(truth => truth is { } rate ? ExactRace.Of(stakes, rate).MeanTrials : 0);

        IsWithin(Exact(edges.Target), expected.AtTarget);
        IsWithin(Exact(edges.LowerEdge, edges.UpperEdge), expected.AtTolerance);
        IsWithin(Exact(edges.LowerDefect, edges.UpperDefect), expected.AtDefect);
    }

    static void IsWithin(double exact, double estimate)
    {
        if (!double.IsNaN(exact))
            Assert.InRange(estimate / exact - 1, -Accuracy, Accuracy);
    }
}
