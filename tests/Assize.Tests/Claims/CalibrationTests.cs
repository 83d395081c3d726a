using Assize.Bounds;

namespace Assize.Tests.Claims;

/// <summary>Whole claims through the public surface at risk 0.05 and confidence 0.95: how often each verdict is wrong.</summary>
/// <remarks>
/// 4,000 repetitions of each row, streams of their own. A promise of 0.05 is held against the count that a true 0.05 exceeds
/// with probability 1e-10: over the 10 rows this test is red on right code with probability 1e-9 at most.
/// </remarks>
public class CalibrationTests
{
    const int Repetitions = 4_000;
    const double FalseAlarm = 1e-10;

    [Theory]
    [InlineData(0.5, 0, 0.1, 0.5, true)]
    [InlineData(0.5, 0, 0.1, 0.6, false)]
    [InlineData(0.5, 0, 0.1, 0.4, false)]
    [InlineData(0.5, 0.05, 0.1, 0.55, true)]
    [InlineData(0.5, 0.05, 0.1, 0.6, false)]
    [InlineData(0.1, 0.025, 0.05, 0.125, true)]
    [InlineData(0.1, 0.025, 0.05, 0.15, false)]
    public void Two_sided_claims_keep_both_promises(double target, double tolerance, double defect, double truth, bool isRight) =>
        KeepsPromises(Claim.Rate(target, tolerance, defect), truth, isRight);

    [Theory]
    [InlineData(0.1, true)]
    [InlineData(0.2, false)]
    public void Claims_of_at_most_keep_both_promises(double truth, bool isRight) =>
        KeepsPromises(Claim.RateAtMost(0.1, defect: 0.1), truth, isRight);

    [Fact]
    public void Claims_of_at_least_keep_their_promise() => KeepsPromises(Claim.RateAtLeast(0.9, defect: 0.1), 0.8, isRight: false);

    static void KeepsPromises(RateClaim claim, double truth, bool isRight)
    {
        var loose = claim.WithRisk(0.05).WithConfidence(0.95);
        int wrong = 0;
        for (int i = 0; i < Repetitions; i++)
        {
            var outcome = loose.Judge(rng => rng.NextDouble() < truth).Outcome;
            if (outcome == (isRight ? Outcome.Refuted : Outcome.Upheld))
                wrong++;
        }

        long most = 200;
        while (Binomial.UpperTail(Repetitions, most + 1, 0.05) > FalseAlarm)
            most++;
        Assert.True(wrong <= most, $"{wrong} of {Repetitions} verdicts were wrong; {most} are allowed");
        Assert.True(wrong > 0, "a promise of 0.05 that is never used up at all has not been tried");
    }

    // The race's exact mean is in RateRaceTests: 48,625 and 50,868 trials.
    [Theory]
    [InlineData(0, 48_625)]
    [InlineData(0.005, 50_868)]
    public void A_right_rate_passes_in_under_a_quarter_of_the_fixed_plan(double tolerance, double exactMean)
    {
        var plan = Claim.Rate(0.5, tolerance, defect: 0.01).Plan();

        Assert.InRange(plan.Expected!.AtTarget, exactMean * 0.98, exactMean * 1.02);
        Assert.True(4 * exactMean < plan.FixedTrials, $"{exactMean} of {plan.FixedTrials}");
    }
}
