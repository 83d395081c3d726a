namespace Assize;

/// <summary>What ends a race about a mean that the bets leave open, out of the reserve of both error
/// probabilities.</summary>
abstract class MeanCap
{
    /// <summary>The last trial.</summary>
    public abstract long Trials { get; }

    /// <summary>The same rule before its first draw; only to be asked of one that has taken none.</summary>
    public MeanCap Fresh() => (MeanCap)MemberwiseClone();

    /// <summary>The theorem that decides at the last trial.</summary>
    public abstract string Theorem { get; }

    /// <summary>Takes the next draw; what it decides, or null.</summary>
    public abstract Outcome? Add(double draw);

    /// <summary>What upholds the claim at the last trial, in words.</summary>
    public abstract string Accepts { get; }
}
