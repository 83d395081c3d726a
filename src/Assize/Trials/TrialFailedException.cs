namespace Assize;

/// <summary>A trial threw before the claim was decided. The message begins with the trial's own; its exception is the inner one.</summary>
public sealed class TrialFailedException : Exception
{
    internal TrialFailedException(string message, long trial, string? replayKey, Exception inner) : base(message, inner) =>
        (Trial, ReplayKey) = (trial, replayKey);

    /// <summary>The trial, counted from 1.</summary>
    public long Trial { get; }

    /// <summary>What OnlyTrial takes to run this trial alone; null when the source takes no generator.</summary>
    public string? ReplayKey { get; }
}
