using Assize.Bounds;

namespace Assize;

/// <summary>What counts say about a rate when trials stop.</summary>
static class RateReport
{
    // Wider than the rounding of a logarithm of a mass, so that the ends lie outwards.
    const double Rounding = 1e-9;

    public static RaceReport Of(
        RatePlan plan, RateBets bets, long trials, long successes, string theorem, long cap) => new()
    {
        Trials = trials,
        Successes = successes,
        Observed = trials == 0 ? double.NaN : (double)successes / trials,
        Seen = trials == 0 ? null : Wording.Count(successes, trials),
        Interval = Interval(trials, successes, plan.Confidence),
        LogEvidenceAgainstClaim =
            Bet.Average(bets.ClaimFromAbove, bets.ClaimFromBelow, trials, successes).AtLeast,
        LogEvidenceAgainstDefectBelow = bets.DefectBelow?.Wealth(trials, successes).AtLeast,
        LogEvidenceAgainstDefectAbove = bets.DefectAbove?.Wealth(trials, successes).AtLeast,
        Miss = plan.Miss,
        Theorem = theorem,
        Cap = cap,
    };

    /// <summary>The rates against which an even bet on all rates has not won 1/(1 - confidence): valid at any stopping
    /// time.</summary>
    /// <remarks>That wealth is 1/((n + 1)·P(S = s)), the mass taken at the rate in question.</remarks>
    public static (double Lower, double Upper) Interval(long trials, long successes, double confidence)
    {
        double level = Elementary.LogOnePlus(-confidence) - Elementary.LogOnePlus(trials) - Rounding;
        double observed = trials == 0 ? 0.5 : (double)successes / trials;
        double Lead(double rate) => Binomial.LogMass(trials, successes, rate) - level;
        double lower = Lead(0) >= 0 ? 0 : RootBracket.Find(Lead, 0, observed, 1e-12).Lower;
        double upper = Lead(1) >= 0 ? 1 : RootBracket.Find(Lead, observed, 1, 1e-12).Upper;
        return (lower, upper);
    }
}
