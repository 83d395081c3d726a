namespace Assize;

/// <summary>The logarithm of a wealth, and what rounding may have done to it.</summary>
/// <param name="Value">The logarithm as it came out.</param>
/// <param name="Error">The true logarithm is no farther away than this.</param>
readonly record struct LogWealth(double Value, double Error)
{
    /// <summary>What it surely is at least: only this decides.</summary>
    public double AtLeast => Value - Error;

    /// <summary>What it surely is at most: what stays below a level here needs no exact test.</summary>
    public double AtMost => Value + Error;
}
