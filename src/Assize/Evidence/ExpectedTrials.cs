namespace Assize;

/// <summary>About how many trials a race takes, by what is true. Estimates for people: no verdict rests on them.</summary>
/// <remarks>Exact for races of up to 4,000 trials; beyond, a walk of coarser steps with the same mean and variance, within 2 %.</remarks>
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

    internal static ExpectedTrials Of(Bounds.Edges edges, RateStakes stakes)
    {
        double At(params ReadOnlySpan<double?> truths)
        {
            double longest = 0;
            foreach (double? truth in truths)
                longest = Math.Max(longest, truth is { } rate ? new RaceWalk(stakes, rate).Mean() : 0);
            return longest;
        }

        double atTarget = At(edges.Target);
        bool exact = (edges.UpperEdge ?? edges.Target) == edges.Target && (edges.LowerEdge ?? edges.Target) == edges.Target;
        return new(atTarget, exact ? atTarget : At(edges.LowerEdge, edges.UpperEdge), At(edges.LowerDefect, edges.UpperDefect));
    }
}
