namespace Assize.Bounds;

/// <summary>The regularised incomplete gamma functions: the tails of a gamma law of scale 1.</summary>
/// <remarks>
/// Relative error below 5e-13 while the result is above 1e-300, for shapes up to 1e9; below shape ½ while the result is
/// above 1e-15. Source: A. Gil, J. Segura and N. M. Temme, SIAM J. Sci. Comput. 34 (2012) A2965–A2981, for the regions;
/// the leading factor is taken from the deviance, as C. Loader (2000) does for the Poisson mass.
/// </remarks>
public static class IncompleteGamma
{
    internal const double MaximumShape = 1e12;

    /// <summary>The probability above a point.</summary>
    /// <param name="shape">The shape, in [1e-10, 1e12].</param>
    /// <param name="point">The point in units of the scale, in [0, ∞].</param>
    /// <returns>Q(shape, point) = P(X &gt; point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperTail(double shape, double point)
    {
        Require(shape, point);
        if (point == 0)
            return 1;
        if (double.IsPositiveInfinity(point))
            return 0;

        return IsUpper(shape, point)
            ? Math.Min(1, Elementary.Exp(LogUpperDirect(shape, point)))
            : 1 - LowerTail(shape, point);
    }

    /// <summary>The probability below a point.</summary>
    /// <param name="shape">The shape, in [1e-10, 1e12].</param>
    /// <param name="point">The point in units of the scale, in [0, ∞].</param>
    /// <returns>P(shape, point) = P(X ≤ point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LowerTail(double shape, double point)
    {
        Require(shape, point);
        if (point == 0)
            return 0;
        if (double.IsPositiveInfinity(point))
            return 1;

        return IsUpper(shape, point)
            ? 1 - UpperTail(shape, point)
            : Math.Min(1, Elementary.Exp(LogLowerDirect(shape, point)));
    }

    /// <summary>The logarithm of the probability above a point; it does not underflow.</summary>
    /// <param name="shape">The shape, in [1e-10, 1e12].</param>
    /// <param name="point">The point in units of the scale, in [0, ∞].</param>
    /// <returns>ln Q(shape, point), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogUpperTail(double shape, double point)
    {
        Require(shape, point);
        if (point == 0)
            return 0;
        if (double.IsPositiveInfinity(point))
            return double.NegativeInfinity;

        return IsUpper(shape, point)
            ? Math.Min(0, LogUpperDirect(shape, point))
            : Elementary.LogOnePlus(-LowerTail(shape, point));
    }

    /// <summary>The logarithm of the probability below a point; it does not underflow.</summary>
    /// <param name="shape">The shape, in [1e-10, 1e12].</param>
    /// <param name="point">The point in units of the scale, in [0, ∞].</param>
    /// <returns>ln P(shape, point), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogLowerTail(double shape, double point)
    {
        Require(shape, point);
        if (point == 0)
            return double.NegativeInfinity;
        if (double.IsPositiveInfinity(point))
            return 0;

        return IsUpper(shape, point)
            ? Elementary.LogOnePlus(-UpperTail(shape, point))
            : Math.Min(0, LogLowerDirect(shape, point));
    }

    static void Require(double shape, double point)
    {
        Check.Between(shape, 1e-10, MaximumShape, nameof(shape));
        Check.Between(point, 0, double.PositiveInfinity, nameof(point));
    }

    // One standard deviation above the mean the fraction settles quickly; nearer, one minus the series loses nothing.
    // Below shape and point 1 the lower tail is about x^a: the smaller tail is the one computed.
    static bool IsUpper(double shape, double point) =>
        shape < 1 && point < 1 ? shape * Elementary.Log(point) > -0.7 : point > shape + Math.Sqrt(shape);

    static double LogUpperDirect(double shape, double point)
    {
        if (shape < 1 && point < 1)
            return SmallUpper.Log(shape, point);

        // (a - 1) ln x and ln Γ(a) are below the last place of x by then.
        return point > 1e60 ? -point : LogFactor(shape, point) + Elementary.Log(shape * UpperOver(shape, point));
    }

    static double LogLowerDirect(double shape, double point) =>
        LogFactor(shape, point) + Elementary.Log(
            shape < GammaIntegral.LeastShape ? Series(shape, point) : shape * GammaIntegral.Lower(shape, point));

    // Four deviations out the fraction takes a dozen steps, whatever the shape.
    static double UpperOver(double shape, double point) =>
        shape < GammaIntegral.LeastShape || point > shape + 4 * Math.Sqrt(shape)
            ? GammaFraction.Of(shape, point)
            : GammaIntegral.Upper(shape, point);

    // x^a e^-x / Γ(a + 1).
    static double LogFactor(double shape, double point)
    {
        if (shape < 0.5)
            return shape * Elementary.Log(point) - point - LogGamma.OfOnePlus(shape);

        return -CountDeviance.Of(shape, point - shape, point) - StirlingError.Of(shape)
            - 0.5 * Elementary.Log(2 * Math.PI * shape);
    }

    // 1 + x/(a + 1) + x²/((a + 1)(a + 2)) + …: every term positive. What an addition rounds off is carried on (Kahan
    // 1965): 100,000 like terms lose 1e-12 otherwise.
    static double Series(double shape, double point)
    {
        const int cap = 1_000_000;
        double term = 1, sum = 1, lost = 0;
        for (int k = 1; k < cap; k++)
        {
            term *= point / (shape + k);
            double owed = term - lost;
            double next = sum + owed;
            lost = next - sum - owed;
            sum = next;
            if (term <= 1e-17 * sum)
                return sum;
        }

        throw new InvalidOperationException(
            $"The gamma series of shape {Check.Text(shape)} at {Check.Text(point)} did not settle in {cap} steps.");
    }
}
