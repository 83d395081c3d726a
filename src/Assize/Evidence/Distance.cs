namespace Assize;

/// <summary>The greatest difference between two cumulative distributions, and where it is.</summary>
/// <param name="Value">The difference, in [0, 1].</param>
/// <param name="Where">The point, in words.</param>
sealed record Distance(double Value, string Where)
{
    /// <summary>From draws, each with what is claimed up to it and below it.</summary>
    public static Distance Of(ReadOnlySpan<double> values, ReadOnlySpan<double> upTo, ReadOnlySpan<double> below)
    {
        (double most, int at, bool isBelow) = (double.NegativeInfinity, 0, false);
        int count = values.Length;
        for (int first = 0, next; first < count; first = next)
        {
            for (next = first + 1; next < count && values[next] == values[first]; next++)
            {
            }

            double over = Math.Abs((double)next / count - upTo[first]);
            double under = Math.Abs(below[first] - (double)first / count);
            if (over > most)
                (most, at, isBelow) = (over, first, false);
            if (under > most)
                (most, at, isBelow) = (under, first, true);
        }

        double point = values[at];
        string draws = Wording.Share((isBelow ? CountBelow(values, point) : CountUpTo(values, point)) / (double)count, count);
        return new(most, $"{(isBelow ? "below" : "up to")} {Wording.Number(point)}: {draws} of the draws, "
            + $"{Wording.Share(isBelow ? below[at] : upTo[at], count)} claimed");
    }

    /// <summary>From the draws of two sources, as many of each.</summary>
    public static Distance Between(ReadOnlySpan<double> one, ReadOnlySpan<double> other)
    {
        (double most, double point) = (0, one[0]);
        for (int i = 0, j = 0; i < one.Length || j < other.Length;)
        {
            double value = j == other.Length || (i < one.Length && one[i] <= other[j]) ? one[i] : other[j];
            while (i < one.Length && one[i] == value)
                i++;
            while (j < other.Length && other[j] == value)
                j++;
            double difference = Math.Abs((double)i / one.Length - (double)j / other.Length);
            if (difference > most)
                (most, point) = (difference, value);
        }

        return new(most, $"up to {Wording.Number(point)}: {Wording.Share(CountUpTo(one, point) / (double)one.Length, one.Length)} of the one source, "
            + $"{Wording.Share(CountUpTo(other, point) / (double)other.Length, other.Length)} of the other");
    }

    static int CountUpTo(ReadOnlySpan<double> sorted, double point) => First(sorted, value => value > point);

    static int CountBelow(ReadOnlySpan<double> sorted, double point) => First(sorted, value => value >= point);

    static int First(ReadOnlySpan<double> sorted, Func<double, bool> holds)
    {
        (int low, int high) = (0, sorted.Length);
        while (low < high)
        {
            int middle = low + (high - low) / 2;
            (low, high) = holds(sorted[middle]) ? (low, middle) : (middle + 1, high);
        }

        return low;
    }
}
