namespace Assize.Analyzers;

/// <summary>The values of one quantity for which a condition holds, in real arithmetic. Null is an open side.</summary>
sealed record Interval(double? Low, bool LowIn, double? High, bool HighIn)
{
    public static Interval From(double low, bool included) => new(low, included, null, false);

    public static Interval UpTo(double high, bool included) => new(null, false, high, included);

    public Interval And(Interval other)
    {
        var (low, lowIn) = Inner(Low, LowIn, other.Low, other.LowIn, sign: 1);
        var (high, highIn) = Inner(High, HighIn, other.High, other.HighIn, sign: -1);
        return new(low, lowIn, high, highIn);
    }

    static (double?, bool) Inner(double? a, bool aIn, double? b, bool bIn, int sign)
    {
        if (a is null || b is null)
            return a is null ? (b, bIn) : (a, aIn);
        return a == b ? (a, aIn && bIn) : sign * a > sign * b ? (a, aIn) : (b, bIn);
    }
}
