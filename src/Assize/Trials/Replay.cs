namespace Assize;

/// <summary>What of a run a seed can bring back.</summary>
enum Replay
{
    /// <summary>Nothing: the source draws from somewhere else.</summary>
    None,

    /// <summary>Every trial, alone.</summary>
    Trial,

    /// <summary>Every batch of trials, whole.</summary>
    Batch,

    /// <summary>Nothing is needed: the draws were there before.</summary>
    Sample,
}
