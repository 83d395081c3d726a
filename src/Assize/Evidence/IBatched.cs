namespace Assize;

/// <summary>A race whose draws are large: few of them are kept at once.</summary>
interface IBatched
{
    /// <summary>How many draws a thread takes at a time.</summary>
    int Block { get; }
}
