using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>
/// From a condition on one counter to the counts that pass; null as soon as the two ways to find them disagree.
/// </summary>
static class BandReader
{
    // How far an edge found by algebra may be from the edge the arithmetic gives.
    const int Slack = 2;

    // Points at which the band is checked over its whole range.
    const int Checks = 64;

    // A meant edge this near 0 or 1, relatively, is the rim: the author bounded one side.
    const double Rim = 1e-9;

    public static CountBand? Read(Requirement requirement)
    {
        if (EstimatorReader.Proportion(requirement.Condition) is not { } estimate)
            return null;
        var (condition, count) = estimate;
        if (!Holds(count) || Isolation.Solve(condition, count) is not { } interval)
            return null;

        bool Passes(long successes) =>
            Arithmetic.Convert(count.Kind, successes) is { } value
            && condition.With(count, new Known(value)) is Known { Value: true };

        long trials = count.Passes;
        long? low = interval.Low is { } lower ? Edge(lower, trials, successes => Passes(successes)) : 0;
        long? high = interval.High is { } upper
            ? trials - Edge(trials - upper, trials, successes => Passes(trials - successes)) : trials;
        if (low is not { } first || high is not { } last || first >= last || !IsConsistent(Passes, first, last, trials))
            return null;

        Interval meant = MeantBy(requirement, condition, count) ?? interval;
        double? centre = CentreOf(meant, trials);
        double tolerance = centre is null ? 0 : (meant.High!.Value - meant.Low!.Value) / 2 / trials;
        return new CountBand(count, first, last, Shares(interval, trials), centre, tolerance);
    }

    static Interval? MeantBy(Requirement requirement, Term condition, Sum count) =>
        requirement.Meant is { } meant && EstimatorReader.Proportion(meant) is { } stated && stated.Count == count
            ? Isolation.Meant(stated.Condition, count)
            : Isolation.Meant(condition, count);

    // The first count that passes: red just below it, green on it.
    static long? Edge(double proposed, long trials, Func<long, bool> passes)
    {
        if (proposed <= -Slack - 1)
            return 0;
        if (proposed > trials + Slack)
            return null;
        long near = (long)Math.Ceiling(proposed);
        for (long count = Math.Max(0, near - Slack); count <= Math.Min(trials, near + Slack + 1); count++)
        {
            if (passes(count))
                return count == 0 || !passes(count - 1) ? count : null;
        }

        return null;
    }

    static bool IsConsistent(Func<long, bool> passes, long first, long last, long trials)
    {
        for (int step = 0; step <= Checks; step++)
        {
            long count = (long)((double)trials * step / Checks);
            if (passes(count) != (count >= first && count <= last))
                return false;
        }

        return passes(first) && passes(last) && (last == trials || !passes(last + 1));
    }

    static double? CentreOf(Interval meant, long trials)
    {
        if (meant.Low is not { } low || meant.High is not { } high)
            return null;
        if (Math.Abs(low) <= Rim * trials || Math.Abs(high - trials) <= Rim * trials)
            return null;
        double centre = (low + high) / 2 / trials;
        // A target is written in decimal: 0.30000000000000004 is 0.3.
        double rounded = Math.Round(centre, 12);
        return rounded is > 0 and < 1 ? rounded : null;
    }

    static Interval Shares(Interval counts, long trials) =>
        counts with { Low = counts.Low / trials, High = counts.High / trials };

    // Beyond this an int counter wraps and a float counter stands still.
    static bool Holds(Sum count) => count.Kind switch
    {
        NumberKind.Int32 => count.Passes < int.MaxValue,
        NumberKind.Single => count.Passes < 1 << 24,
        _ => true,
    };
}
