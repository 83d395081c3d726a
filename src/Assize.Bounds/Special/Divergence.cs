namespace Assize.Bounds;

/// <summary>The Kullback–Leibler divergence of one rate from another, and its inverses.</summary>
public static class Divergence
{
    const double Precision = 4e-16;

    /// <summary>How fast evidence against one rate gathers, a trial, when another is observed.</summary>
    /// <param name="observed">The rate observed, in [0, 1].</param>
    /// <param name="rate">The rate it is held against, in [0, 1].</param>
    /// <returns>x ln(x/p) + (1-x) ln((1-x)/(1-p)), in [0, ∞]; relative error below 2e-15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A rate lies outside [0, 1], or is NaN.</exception>
    public static double Bernoulli(double observed, double rate)
    {
        Check.Probability(observed, nameof(observed));
        Check.Probability(rate, nameof(rate));
        double excess = rate - observed;
        return Between(observed, 1 - observed, rate, 1 - rate, -excess);
    }

    /// <summary>The same where both complements and the difference observed - rate are known without
    /// cancellation.</summary>
    internal static double Between(
        double observed, double otherObserved, double rate, double otherRate, double difference) =>
        CountDeviance.Of(observed, -difference, rate) + CountDeviance.Of(otherObserved, difference, otherRate);

    /// <summary>The greatest rate whose divergence from the observed one stays within a bound.</summary>
    /// <param name="observed">The rate observed, in [0, 1].</param>
    /// <param name="divergence">The bound, in [0, ∞).</param>
    /// <returns>p ≥ x with KL(x ‖ p) = divergence, in [x, 1]; relative error below 5e-13.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperInverse(double observed, double divergence)
    {
        Require(observed, divergence);
        if (divergence == 0 || observed == 1)
            return observed;

        double other = 1 - observed;
        return divergence <= Apart(observed, other, other / 2)
            ? observed + Distance(observed, other, divergence)
            : 1 - Remainder(observed, other, divergence);
    }

    /// <summary>The least rate whose divergence from the observed one stays within a bound.</summary>
    /// <param name="observed">The rate observed, in [0, 1].</param>
    /// <param name="divergence">The bound, in [0, ∞).</param>
    /// <returns>p ≤ x with KL(x ‖ p) = divergence, in [0, x]; relative error below 5e-13 above 1e-300.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LowerInverse(double observed, double divergence)
    {
        Require(observed, divergence);
        if (divergence == 0 || observed == 0)
            return observed;

        double other = 1 - observed;
        return divergence <= Apart(other, observed, observed / 2)
            ? observed - Distance(other, observed, divergence)
            : Remainder(other, observed, divergence);
    }

    static void Require(double observed, double divergence)
    {
        Check.Probability(observed, nameof(observed));
        Check.Between(divergence, 0, double.MaxValue, nameof(divergence));
    }

    // The divergence when one of the two rates has grown, and the other shrunk, by a distance.
    static double Apart(double growing, double shrinking, double distance) =>
        CountDeviance.Of(growing, distance, growing + distance)
            + CountDeviance.Of(shrinking, -distance, shrinking - distance);

    // Up to half of the shrinking rate: the distance itself, so that a small one keeps its digits.
    static double Distance(double growing, double shrinking, double divergence)
    {
        double upper = Math.Min(shrinking / 2, Math.Sqrt(2 * divergence * growing * shrinking) + divergence);
        while (upper < shrinking / 2 && Apart(growing, shrinking, upper) < divergence)
            upper = Math.Min(shrinking / 2, 2 * upper);

        double lower = upper / 2;
        while (Apart(growing, shrinking, lower) > divergence)
            lower /= 2;

        return RootBracket.Find(x => Apart(growing, shrinking, x) - divergence, lower, upper, Precision).Upper;
    }

    // Beyond: what is left of the shrinking rate, b·e^-v, found through v, in which the divergence is nearly linear.
    static double Remainder(double growing, double shrinking, double divergence)
    {
        double At(double v) => shrinking * v
            + CountDeviance.Of(growing, shrinking * -Elementary.ExpMinusOne(-v),
                growing + shrinking * -Elementary.ExpMinusOne(-v))
            - shrinking * -Elementary.ExpMinusOne(-v) - divergence;

        double upper = 2;
        while (At(upper) < 0 && upper < 1000)
            upper *= 2;

        return upper >= 1000 && At(upper) < 0
            ? 0
            : shrinking * Elementary.Exp(-RootBracket.Find(At, 0.5, upper, Precision).Upper);
    }
}
