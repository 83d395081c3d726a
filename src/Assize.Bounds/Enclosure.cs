namespace Assize.Bounds;

/// <summary>An interval that is certain to contain a probability.</summary>
/// <remarks>Rounding is included: <see cref="Lower"/> is never above the truth and <see cref="Upper"/> never below
/// it.</remarks>
public sealed record Enclosure
{
    /// <summary>An enclosure from its two ends.</summary>
    /// <param name="lower">The least the probability can be, in [0, <paramref name="upper"/>].</param>
    /// <param name="upper">The most the probability can be, in [<paramref name="lower"/>, 1].</param>
    /// <exception cref="ArgumentOutOfRangeException">An end lies outside its domain, or is NaN.</exception>
    public Enclosure(double lower, double upper)
    {
        Check.Probability(upper, nameof(upper));
        Check.Between(lower, 0, upper, nameof(lower));
        Lower = lower;
        Upper = upper;
    }

    /// <summary>The least the probability can be, in [0, 1]; 0 where nothing better is known.</summary>
    public double Lower { get; }

    /// <summary>The most the probability can be, in [0, 1]; 1 where nothing better is known.</summary>
    public double Upper { get; }

    // Above the error of the exponential and of a few products.
    internal const double Rounding = 1e-12;

    // Above the error of a divergence, 2e-15, and of a few products: 7e-12 of the probability at e^-690.
    const double ExponentRounding = 1e-14;

    /// <summary>[0, probability], rounded up; the probability is known to a relative 9e-13 or better.</summary>
    internal static Enclosure UpTo(double probability) =>
        new(0, Math.Min(1, Math.Max(1e-300, probability * (1 + Rounding))));

    /// <summary>[0, e^-exponent], rounded up; the exponent is known to a relative 9e-15 or better.</summary>
    internal static Enclosure UpToExponential(double exponent) =>
        exponent > 0 ? UpTo(Elementary.Exp(-exponent * (1 - ExponentRounding))) : new(0, 1);

    /// <summary>The two ends moved outwards by a relative amount; below 1e-300 that means nothing.</summary>
    internal static Enclosure Widened(double lower, double upper, double rounding) => new(
        lower < 1e-300 ? 0 : Math.Min(1, lower * Math.Max(0, 1 - rounding)),
        Math.Min(1, Math.Max(1e-300, upper * (1 + rounding))));

    /// <summary>What encloses one less the probability.</summary>
    internal Enclosure Complement() =>
        new(Math.Max(0, (1 - Upper) * (1 - Rounding)), Math.Min(1, (1 - Lower) * (1 + Rounding)));
}
