using System.Numerics;

namespace Assize;

/// <summary>Which cells are due at which trial: rings of buckets, so that a trial asks only for its own.</summary>
sealed class Deadlines
{
    const int None = -1;

    readonly long[] _due;
    readonly int[] _next;
    readonly int[] _first;
    readonly int[] _taken;

    public Deadlines(int cells)
    {
        _due = new long[cells];
        _next = new int[cells];
        _taken = new int[cells];
        _first = new int[BitOperations.RoundUpToPowerOf2((uint)Math.Max(256, 2 * cells))];
        Array.Fill(_first, None);
    }

    /// <summary>Makes a cell due; it must not be waiting already.</summary>
    public void Add(int cell, long trial)
    {
        ref int first = ref Bucket(trial);
        (_due[cell], _next[cell], first) = (trial, first, cell);
    }

    /// <summary>Takes out all cells due at a trial. Trials are asked for in their order; the answer holds until the
    /// next.</summary>
    public ReadOnlySpan<int> Take(long trial)
    {
        int taken = 0;
        ref int link = ref Bucket(trial);
        while (link != None)
        {
            int cell = link;
            if (_due[cell] == trial)
                (link, _taken[taken++]) = (_next[cell], cell);
            else
                link = ref _next[cell];
        }

        return _taken.AsSpan(0, taken);
    }

    ref int Bucket(long trial) => ref _first[(int)(trial & (_first.Length - 1))];
}
