namespace Assize.Bounds;

/// <summary>What is vouched for about one draw of a mean, for right and for defective code alike.</summary>
/// <remarks>Every bound of a plan holds for all distributions that these facts allow, and for no others.</remarks>
public sealed record MeanFacts
{
    /// <summary>No draw is smaller; null when not known. Same unit as the draws.</summary>
    public double? Minimum { get; private init; }

    /// <summary>No draw is greater; null when not known. Same unit as the draws.</summary>
    public double? Maximum { get; private init; }

    /// <summary>The standard deviation of a draw is at most this; null when not known. Same unit as the
    /// draws.</summary>
    public double? StandardDeviation { get; private init; }

    /// <summary>E exp(λ(X - EX)) ≤ exp(λ²·proxy²/2) for every λ; null when not known. Same unit as the
    /// draws.</summary>
    public double? Proxy { get; private init; }

    /// <summary>The mean of the square of a draw is at most this, and no draw is negative; null when not known.</summary>
    public double? SecondMoment { get; private init; }

    /// <summary>The facts without any.</summary>
    public static MeanFacts None { get; } = new();

    /// <summary>Adds that every draw lies in a range.</summary>
    /// <param name="minimum">The least possible draw, finite.</param>
    /// <param name="maximum">The greatest possible draw, finite and above <paramref name="minimum"/>.</param>
    /// <returns>These facts and this one.</returns>
    /// <exception cref="ClaimRefusedException">The range is empty, not finite, or NaN.</exception>
    public MeanFacts Between(double minimum, double maximum) =>
        minimum < maximum && maximum - minimum <= double.MaxValue
            ? this with { Minimum = minimum, Maximum = maximum }
            : throw new ClaimRefusedException($"Draws lie between two finite numbers, the smaller one first; "
                + $"given were {Check.Text(minimum)} and {Check.Text(maximum)}.");

    /// <summary>Adds a bound on the standard deviation of a draw.</summary>
    /// <param name="standardDeviation">The bound, above 0.</param>
    /// <returns>These facts and this one.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0 and finite, or is NaN.</exception>
    public MeanFacts DeviatingAtMost(double standardDeviation) =>
        this with { StandardDeviation = Positive(standardDeviation, "standard deviation") };

    /// <summary>Adds that the tails of a draw are no heavier than a normal one's.</summary>
    /// <param name="proxy">The standard deviation of that normal distribution, above 0.</param>
    /// <returns>These facts and this one, and that the standard deviation is at most as large.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0 and finite, or is NaN.</exception>
    public MeanFacts SubGaussian(double proxy) => this with
    {
        // The second moments of both sides of the inequality at λ = 0.
        Proxy = Positive(proxy, "proxy"),
        StandardDeviation = Math.Min(StandardDeviation ?? double.MaxValue, proxy),
    };

    /// <summary>Adds that no draw is negative and that their squares are not great on average.</summary>
    /// <param name="secondMoment">At least the mean of the square of a draw, above 0.</param>
    /// <returns>These facts and this one, and that the variance is at most as large.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0 and finite, or is NaN.</exception>
    public MeanFacts NonNegative(double secondMoment)
    {
        double deviation = Math.Sqrt(Positive(secondMoment, "second moment"));
        return this with
        {
            Minimum = Math.Max(Minimum ?? 0, 0),
            SecondMoment = secondMoment,
            StandardDeviation = Math.Min(StandardDeviation ?? double.MaxValue, deviation),
        };
    }

    /// <summary>Greatest minus least possible draw; null when not known.</summary>
    public double? Range => Maximum - Minimum;

    /// <summary>The facts about a draw with its sign changed.</summary>
    internal MeanFacts Mirrored() => this with { Minimum = -Maximum, Maximum = -Minimum };

    static double Positive(double value, string what) => value > 0 && value <= 1e150
        ? value
        : throw new ClaimRefusedException($"The {what} of a draw must be above 0; it is {Check.Text(value)}.");
}
