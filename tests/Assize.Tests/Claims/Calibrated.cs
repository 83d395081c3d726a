using Assize.Bounds;

namespace Assize.Tests.Claims;

/// <summary>Holds the share of wrong verdicts at risk 0.05 and confidence 0.95 against the promise.</summary>
/// <remarks>
/// 1,500 repetitions, streams of their own. A promise of 0.05 is held against the count that a true 0.05 exceeds with
/// probability 1e-11; with fewer than 100 such checks in these tests, right code is red with probability 1e-9 at most.
/// </remarks>
static class Calibrated
{
    public const int Repetitions = 1_500;
    const double FalseAlarm = 1e-11;

    static readonly long Most = Enumerable.Range(75, 500).First(most => Binomial.UpperTail(Repetitions, most + 1, 0.05) <= FalseAlarm);

    /// <summary>Judges as often as it takes; the truth is within tolerance, or at the defect or beyond.</summary>
    /// <returns>The share of wrong verdicts and the mean number of trials.</returns>
    public static (double Wrong, double Trials) Keeps<TClaim>(TClaim claim, Func<TClaim, Verdict> judge, bool isRight) where TClaim : Claim
    {
        var loose = claim.WithRisk(0.05).WithConfidence(0.95);
        int wrong = 0;
        double trials = 0;
        for (int i = 0; i < Repetitions; i++)
        {
            var verdict = judge(loose);
            wrong += verdict.Outcome == (isRight ? Outcome.Refuted : Outcome.Upheld) ? 1 : 0;
            trials += verdict.Trials;
        }

        Assert.True(wrong <= Most, $"{loose}: {wrong} of {Repetitions} verdicts were wrong; {Most} are allowed");
        return (wrong / (double)Repetitions, trials / Repetitions);
    }
}
