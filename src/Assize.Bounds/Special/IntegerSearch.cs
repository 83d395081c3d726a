namespace Assize.Bounds;

/// <summary>Where a condition that holds from some whole number on begins to hold.</summary>
static class IntegerSearch
{
    /// <summary>The first number in [least, most] where the condition holds, or most + 1; quick when the guess is
    /// near.</summary>
    public static long First(long least, long most, long guess, Func<long, bool> holds)
    {
        if (least > most)
            return most + 1;

        long low = least - 1;
        long high = most + 1;
        long probe = Math.Max(least, Math.Min(most, guess));
        long stride = 1;
        while (low + 1 < high)
        {
            if (holds(probe))
                high = probe;
            else
                low = probe;

            bool bracketed = low >= least && high <= most;
            probe = bracketed ? low + (high - low) / 2
                : high <= most ? Math.Max(least, high - stride)
                : Math.Min(most, low + stride);
            stride = Math.Min(stride * 4, most - least + 1);
        }

        return high;
    }
}
