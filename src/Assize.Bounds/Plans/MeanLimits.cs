namespace Assize.Bounds;

/// <summary>Which averages uphold a claim about a mean at a number of trials.</summary>
public sealed class MeanLimits
{
    internal MeanLimits(long trials, double acceptLow, double acceptHigh, bool meetsBoth) =>
        (Trials, AcceptLow, AcceptHigh, MeetsBoth) = (trials, acceptLow, acceptHigh, meetsBoth);

    /// <summary>The number of trials, at least 1.</summary>
    public long Trials { get; }

    /// <summary>The least average that upholds the claim; -∞ when none is too low.</summary>
    public double AcceptLow { get; }

    /// <summary>The greatest average that upholds the claim; ∞ when none is too high.</summary>
    public double AcceptHigh { get; }

    /// <summary>Whether both probabilities are within what the plan allows.</summary>
    public bool MeetsBoth { get; }

    /// <summary>Whether an average upholds the claim.</summary>
    /// <param name="average">The average of all <see cref="Trials"/> draws, or whatever the plan's statistic
    /// is.</param>
    /// <returns>True from <see cref="AcceptLow"/> to <see cref="AcceptHigh"/>.</returns>
    public bool Accept(double average) => average >= AcceptLow && average <= AcceptHigh;
}
