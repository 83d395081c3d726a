namespace Assize.Bounds;

/// <summary>The upper tail and quantile of Student's law.</summary>
/// <remarks>Relative error of the tail below 5e-13 while the result is above 1e-300, for up to 1e9 degrees of
/// freedom.</remarks>
public static class Student
{
    /// <summary>The probability above a point.</summary>
    /// <param name="degrees">Degrees of freedom, in [1, 1e12].</param>
    /// <param name="point">Any number.</param>
    /// <returns>P(T &gt; point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperTail(double degrees, double point) =>
        point < 0 ? 1 - UpperTail(degrees, -point) : Elementary.Exp(LogUpperTail(degrees, point));

    /// <summary>The logarithm of the probability above a point; it does not underflow.</summary>
    /// <param name="degrees">Degrees of freedom, in [1, 1e12].</param>
    /// <param name="point">A number of magnitude up to 1e150.</param>
    /// <returns>ln P(T &gt; point), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogUpperTail(double degrees, double point)
    {
        Check.Between(degrees, 1, 1e12, nameof(degrees));
        Check.Between(point, -1e150, 1e150, nameof(point));
        if (point < 0)
            return Elementary.LogOnePlus(-UpperTail(degrees, -point));

        double square = point * point;
        double whole = degrees + square;
        double excess = 0.5 * degrees * ((1 - point) * (1 + point) / whole);
        if (point >= 1)
            return IncompleteBeta.LogLower(0.5 * degrees, 0.5, degrees / whole, square / whole, excess) - LogTwo;

        double central = point == 0
            ? 0
            : Elementary.Exp(IncompleteBeta.LogLower(0.5, 0.5 * degrees, square / whole, degrees / whole, -excess));
        return Elementary.LogOnePlus(-central) - LogTwo;
    }

    /// <summary>The point that a probability lies above.</summary>
    /// <param name="degrees">Degrees of freedom, in [1, 1e12].</param>
    /// <param name="probability">The probability above the point, in [1e-140, 1).</param>
    /// <returns>t with P(T &gt; t) = probability; relative error below 5e-13.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperQuantile(double degrees, double probability)
    {
        Check.Between(degrees, 1, 1e12, nameof(degrees));
        Check.Between(probability, 1e-140, 1 - 1e-16, nameof(probability));
        if (probability > 0.5)
            return -UpperQuantile(degrees, 1 - probability);
        if (probability == 0.5)
            return 0;

        // In the logarithm of the point: quantiles reach from 1e-16 to 1e140.
        double wanted = Elementary.Log(probability);
        var (lower, upper) = RootBracket.Find(
            x => LogUpperTail(degrees, Elementary.Exp(x)) - wanted, -45, 340, 4e-16);
        return Elementary.Exp(lower + (upper - lower) / 2);
    }

    const double LogTwo = 0.693147180559945309417;
}
