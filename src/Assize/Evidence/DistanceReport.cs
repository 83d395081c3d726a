using Assize.Bounds;

namespace Assize;

/// <summary>What a distance between distributions says when trials stop.</summary>
static class DistanceReport
{
    const double LogTwo = 0.693147180559945309417;

    public static RaceReport Of(DistributionPlan plan, long trials, Distance? distance, long cap, string? contradiction)
    {
        bool isLook = plan.Looks.Contains(trials) && distance is not null;
        double seen = distance?.Value ?? double.NaN;
        double margin = isLook ? plan.Margin(trials) : double.NaN;
        return new RaceReport
        {
            Trials = trials,
            Observed = seen,
            Seen = distance is null ? null : $"a distance of {Wording.Share(seen, trials)}, {distance.Where}",
            Interval = isLook ? (Math.Max(0, seen - margin), Math.Min(1, seen + margin)) : (double.NaN, double.NaN),
            LogEvidenceAgainstClaim = contradiction is not null ? double.PositiveInfinity
                : isLook ? Evidence(plan.LogChanceIfRight(trials, seen)) : -LogTwo,
            LogEvidenceAgainstDefectBelow = null,
            LogEvidenceAgainstDefectAbove = isLook ? Evidence(plan.LogChanceIfDefect(trials, seen)) : -LogTwo,
            Miss = plan.Miss,
            Theorem = $"{plan.Theorem}; {Wording.Number((long)plan.Looks.Count)} looks",
            Cap = cap,
            Contradiction = contradiction,
            Counts = distance is null ? null : new Dictionary<string, double> { ["distance"] = seen },
        };
    }

    // ∫₀¹ κ·p^(κ-1) dκ = (1 - p + p ln p)/(p ln² p): a chance made into a wealth whose mean is 1 at most (V. Vovk and
    // R. Wang, Ann. Statist. 49 (2021) 1736, from memory). It is ½ for p = 1, and grows as p falls.
    static double Evidence(double logChance)
    {
        double log = -logChance;
        return log < 0.1 ? -LogTwo
            : double.IsPositiveInfinity(log) ? log
            : Elementary.LogOnePlus(-(1 + log) * Elementary.Exp(-log)) + log - 2 * Elementary.Log(log);
    }
}
