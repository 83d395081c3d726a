namespace Assize;

/// <summary>A straight line that a count must cross before it can reach a trigger, over a stretch of trials.</summary>
/// <remarks>
/// The logarithm of a wealth is convex in trials and successes, so the counts below a level form a convex set: its upper
/// rim lies above each of its chords, its lower rim below.
/// </remarks>
readonly struct Chord
{
    readonly long _first;
    readonly long _length;
    readonly long _start;
    readonly long _rise;
    readonly bool _isUpper;

    Chord(long first, long length, long start, long end, bool isUpper) =>
        (_first, _length, _start, _rise, _isUpper) = (first, length, start, end - start, isUpper);

    /// <summary>For a trigger that is reached from below, given its values at both ends of the stretch.</summary>
    public static Chord Upper(long first, long last, long start, long end) =>
        new(first, last - first, start - 1, end - 1, isUpper: true);

    /// <summary>For a trigger that is reached from above.</summary>
    public static Chord Lower(long first, long last, long start, long end) =>
        new(first, last - first, start + 1, end + 1, isUpper: false);

    /// <summary>How many trials it takes at least to cross the line; 0 on its far side, endless for a line never
    /// set.</summary>
    public long Steps(long trials, long successes)
    {
        var lead = (Int128)_length * (successes - _start) - (Int128)_rise * (trials - _first);
        var room = _isUpper ? -lead : lead;
        if (room < 0)
            return 0;

        long nearing = _isUpper ? _length - _rise : _rise;
        return nearing <= 0 ? long.MaxValue : (long)Int128.Min(room / nearing, long.MaxValue - 1) + 1;
    }
}
