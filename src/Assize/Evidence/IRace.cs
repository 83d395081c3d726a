namespace Assize;

/// <summary>What judges draws in trial order; it knows no clock, thread or framework.</summary>
interface IRace<TDraw>
{
    /// <summary>The verdict; null while more draws are wanted.</summary>
    Outcome? Outcome { get; }

    /// <summary>How many trials it takes at least to the verdict, 1 or more: blocks of so many are asked for.</summary>
    long Quiet => 1;

    /// <summary>Takes the draw of the next trial; not to be called after the verdict.</summary>
    void Add(TDraw draw);

    /// <summary>Takes the draws of the next trials. The verdict and its trial are the same as one by one; draws after it
    /// are not looked at.</summary>
    void Add(ReadOnlySpan<TDraw> draws);

    /// <summary>What the draws so far have shown.</summary>
    RaceReport Report();
}
