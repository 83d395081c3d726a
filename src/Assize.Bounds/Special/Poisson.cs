namespace Assize.Bounds;

/// <summary>Probabilities of a Poisson count.</summary>
/// <remarks>Relative error below 5e-13 while the result is above 1e-300, for means up to 1e9.</remarks>
public static class Poisson
{
    /// <summary>The logarithm of the probability of exactly so many.</summary>
    /// <param name="mean">The mean, in [0, 1e12].</param>
    /// <param name="count">The count; below 0 the probability is 0.</param>
    /// <returns>ln P(N = count), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The mean lies outside its domain, or is NaN.</exception>
    public static double LogMass(double mean, long count)
    {
        Require(mean);
        if (count < 0 || (mean == 0 && count > 0))
            return double.NegativeInfinity;
        if (count == 0)
            return -mean;

        // C. Loader, Fast and accurate computation of binomial probabilities (2000), for the Poisson mass.
        return -CountDeviance.Of(count, mean - count, mean) - StirlingError.Of(count)
            - 0.5 * Elementary.Log(2 * Math.PI * count);
    }

    /// <summary>The probability of so many or more.</summary>
    /// <param name="mean">The mean, in [0, 1e12].</param>
    /// <param name="count">The least count, below 1e12.</param>
    /// <returns>P(N ≥ count), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperTail(double mean, long count)
    {
        Require(mean);
        return count <= 0 ? 1 : IncompleteGamma.LowerTail(Shape(count), mean);
    }

    /// <summary>The probability of so many or fewer.</summary>
    /// <param name="mean">The mean, in [0, 1e12].</param>
    /// <param name="count">The greatest count, below 1e12.</param>
    /// <returns>P(N ≤ count), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LowerTail(double mean, long count)
    {
        Require(mean);
        return count < 0 ? 0 : IncompleteGamma.UpperTail(Shape(count) + 1, mean);
    }

    /// <summary>The logarithm of the probability of so many or more; it does not underflow.</summary>
    /// <param name="mean">The mean, in [0, 1e12].</param>
    /// <param name="count">The least count, below 1e12.</param>
    /// <returns>ln P(N ≥ count), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogUpperTail(double mean, long count)
    {
        Require(mean);
        return count <= 0 ? 0 : IncompleteGamma.LogLowerTail(Shape(count), mean);
    }

    /// <summary>The logarithm of the probability of so many or fewer; it does not underflow.</summary>
    /// <param name="mean">The mean, in [0, 1e12].</param>
    /// <param name="count">The greatest count, below 1e12.</param>
    /// <returns>ln P(N ≤ count), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogLowerTail(double mean, long count)
    {
        Require(mean);
        return count < 0 ? double.NegativeInfinity : IncompleteGamma.LogUpperTail(Shape(count) + 1, mean);
    }

    static void Require(double mean) => Check.Between(mean, 0, IncompleteGamma.MaximumShape, nameof(mean));

    static double Shape(long count)
    {
        Check.AtMost(count, (long)IncompleteGamma.MaximumShape - 1, nameof(count));
        return count;
    }
}
