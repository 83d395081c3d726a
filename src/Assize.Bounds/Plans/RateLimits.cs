namespace Assize.Bounds;

/// <summary>Which numbers of successes uphold a rate claim at a number of trials, and how often that verdict is
/// wrong.</summary>
public sealed class RateLimits
{
    internal RateLimits(long trials, long acceptLow, long acceptHigh) =>
        (Trials, AcceptLow, AcceptHigh) = (trials, acceptLow, acceptHigh);

    /// <summary>The number of trials, at least 1.</summary>
    public long Trials { get; }

    /// <summary>The least number of successes that upholds the claim, in [0, <see cref="Trials"/>].</summary>
    public long AcceptLow { get; }

    /// <summary>The greatest number of successes that upholds the claim, in [<see cref="AcceptLow"/>,
    /// <see cref="Trials"/>].</summary>
    public long AcceptHigh { get; }

    /// <summary>The probability of red where it is greatest within the tolerance: at one of the edges.</summary>
    public Enclosure FalseFailure { get; internal init; } = new(0, 1);

    /// <summary>The probability of green at the defect, the greater one if there are two.</summary>
    public Enclosure MissedDefect { get; internal init; } = new(0, 1);

    /// <summary>Whether both probabilities are within what the plan allows, rounding included.</summary>
    public bool MeetsBoth { get; internal init; }

    /// <summary>Whether a number of successes upholds the claim.</summary>
    /// <param name="successes">Successes counted in all <see cref="Trials"/>.</param>
    /// <returns>True from <see cref="AcceptLow"/> to <see cref="AcceptHigh"/>.</returns>
    public bool Accept(long successes) => successes >= AcceptLow && successes <= AcceptHigh;
}
