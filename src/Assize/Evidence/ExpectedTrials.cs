namespace Assize;

/// <summary>About how many trials a race takes, by what is true. Estimates for people: no verdict rests on
/// them.</summary>
/// <remarks>Exact for short races; for longer ones a walk in coarser steps of the same mean and variance.</remarks>
public sealed record ExpectedTrials
{
    ExpectedTrials(double atTarget, double atTolerance, double atDefect) =>
        (AtTarget, AtTolerance, AtDefect) = (atTarget, atTolerance, atDefect);

    /// <summary>When the truth is the target.</summary>
    public double AtTarget { get; }

    /// <summary>When the truth is at the edge of the tolerance; the longer one of two.</summary>
    public double AtTolerance { get; }

    /// <summary>When the truth is at the defect; the longer one of two.</summary>
    public double AtDefect { get; }

    internal static ExpectedTrials Of(RateStakes stakes)
    {
        var table = new TriggerTable(stakes);
        var known = new Dictionary<double, double>();
        double At(double? truth)
        {
            if (truth is not { } rate)
                return 0;
            if (!known.TryGetValue(rate, out double trials))
                known[rate] = trials = RaceWalk.MeanTrials(table, rate);
            return trials;
        }

        var edges = stakes.Plan.Edges;
        // What is alike on both sides needs one walk.
        bool isMirrored = edges.LowerDefect == 1 - edges.UpperDefect && edges.LowerEdge == 1 - edges.UpperEdge;
        return new ExpectedTrials(
            At(edges.Target),
            Math.Max(isMirrored ? 0 : At(edges.LowerEdge), At(edges.UpperEdge)),
            Math.Max(isMirrored ? 0 : At(edges.LowerDefect), At(edges.UpperDefect)));
    }
}
