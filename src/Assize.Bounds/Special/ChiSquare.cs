namespace Assize.Bounds;

/// <summary>Tails and quantiles of the chi-square law.</summary>
/// <remarks>Relative error of the tails below 5e-13 while the result is above 1e-300, for up to 1e9 degrees of
/// freedom.</remarks>
public static class ChiSquare
{
    /// <summary>The probability above a point.</summary>
    /// <param name="degrees">Degrees of freedom, in [1e-9, 1e12].</param>
    /// <param name="point">The point, in [0, ∞].</param>
    /// <returns>P(X &gt; point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperTail(double degrees, double point) =>
        IncompleteGamma.UpperTail(Shape(degrees), Half(point));

    /// <summary>The probability below a point.</summary>
    /// <param name="degrees">Degrees of freedom, in [1e-9, 1e12].</param>
    /// <param name="point">The point, in [0, ∞].</param>
    /// <returns>P(X ≤ point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LowerTail(double degrees, double point) =>
        IncompleteGamma.LowerTail(Shape(degrees), Half(point));

    /// <summary>The logarithm of the probability above a point; it does not underflow.</summary>
    /// <param name="degrees">Degrees of freedom, in [1e-9, 1e12].</param>
    /// <param name="point">The point, in [0, ∞].</param>
    /// <returns>ln P(X &gt; point), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogUpperTail(double degrees, double point) =>
        IncompleteGamma.LogUpperTail(Shape(degrees), Half(point));

    /// <summary>The logarithm of the probability below a point; it does not underflow.</summary>
    /// <param name="degrees">Degrees of freedom, in [1e-9, 1e12].</param>
    /// <param name="point">The point, in [0, ∞].</param>
    /// <returns>ln P(X ≤ point), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogLowerTail(double degrees, double point) =>
        IncompleteGamma.LogLowerTail(Shape(degrees), Half(point));

    /// <summary>The point that a small probability lies above; relative error below 2e-12.</summary>
    /// <param name="degrees">Degrees of freedom, in [1, 2e9].</param>
    /// <param name="probability">The probability above the point, in [1e-140, ½]; beyond ½ see
    /// <see cref="LowerQuantile"/>.</param>
    /// <returns>x with P(X &gt; x) = probability, in (0, ∞).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperQuantile(double degrees, double probability)
    {
        RequireQuantile(degrees, probability);
        return 2 * GammaQuantile.AroundUpper(degrees / 2, probability).Lower;
    }

    /// <summary>The point that a small probability lies below; relative error below 2e-12.</summary>
    /// <param name="degrees">Degrees of freedom, in [1, 2e9].</param>
    /// <param name="probability">The probability below the point, in [1e-140, ½]; beyond ½ see
    /// <see cref="UpperQuantile"/>.</param>
    /// <returns>x with P(X ≤ x) = probability, in (0, ∞).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LowerQuantile(double degrees, double probability)
    {
        RequireQuantile(degrees, probability);
        return 2 * GammaQuantile.AroundLower(degrees / 2, probability).Lower;
    }

    static void RequireQuantile(double degrees, double probability)
    {
        Check.Between(degrees, 1, 2e9, nameof(degrees));
        Check.Between(probability, GammaQuantile.LeastProbability, 0.5, nameof(probability));
    }

    static double Shape(double degrees)
    {
        Check.Between(degrees, 1e-9, 1e12, nameof(degrees));
        return degrees / 2;
    }

    static double Half(double point)
    {
        Check.Between(point, 0, double.PositiveInfinity, nameof(point));
        return point / 2;
    }
}
