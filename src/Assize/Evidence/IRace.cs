namespace Assize;

/// <summary>What judges draws, one by one and in trial order; it knows no clock, thread or framework.</summary>
interface IRace<in TDraw>
{
    /// <summary>The verdict; null while more draws are wanted.</summary>
    Outcome? Outcome { get; }

    /// <summary>Takes the draw of the next trial.</summary>
    void Add(TDraw draw);

    /// <summary>What the draws so far have shown.</summary>
    RaceReport Report();
}
