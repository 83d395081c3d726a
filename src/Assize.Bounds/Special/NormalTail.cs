namespace Assize.Bounds;

/// <summary>Tails of the standard normal distribution.</summary>
/// <remarks>Relative error below 5e-13 while the result is above 1e-300; the logarithm goes on from there.</remarks>
public static class NormalTail
{
    // Below, half minus the central part loses at most two digits; above, Laplace's fraction settles quickly.
    const double Crossing = 2.25;
    const int Cap = 1000;
    const double Precision = 4e-16;
    const double Large = 1e150;
    const double LogRootTwoPi = 0.918938533204672741780;
    const double RootTwoPi = 2.506628274631000502416;

    /// <summary>The probability above a point.</summary>
    /// <param name="point">Any number, in standard deviations.</param>
    /// <returns>P(Z &gt; point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The point is NaN.</exception>
    public static double Upper(double point)
    {
        Check.Between(point, double.NegativeInfinity, double.PositiveInfinity, nameof(point));
        if (point < 0)
            return 1 - Upper(-point);
        if (point > 40)
            return 0;

        return point < Crossing ? 0.5 - Central(point) : Density(point) * Mills(point);
    }

    /// <summary>The probability below a point.</summary>
    /// <param name="point">Any number, in standard deviations.</param>
    /// <returns>P(Z &lt; point), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The point is NaN.</exception>
    public static double Lower(double point) => Upper(-point);

    /// <summary>The logarithm of the probability above a point; it does not underflow.</summary>
    /// <param name="point">A number of standard deviations, at most 1e150.</param>
    /// <returns>ln P(Z &gt; point), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The point is above 1e150 or NaN.</exception>
    public static double LogUpper(double point)
    {
        Check.Between(point, double.NegativeInfinity, Large, nameof(point));
        if (point < 0)
            return Elementary.LogOnePlus(-Upper(-point));

        return point < Crossing
            ? Elementary.Log(Upper(point))
            : -0.5 * point * point - LogRootTwoPi + Elementary.Log(Mills(point));
    }

    /// <summary>The probability above a point divided by the density there (Mills' ratio).</summary>
    /// <param name="point">A number of standard deviations, in [0, 1e150].</param>
    /// <returns>P(Z &gt; point) / φ(point), in (0, 1.2533].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The point lies outside its domain, or is NaN.</exception>
    public static double Mills(double point)
    {
        Check.Between(point, 0, Large, nameof(point));
        return point < Crossing ? (0.5 - Central(point)) / Density(point) : LaplaceFraction(point);
    }

    /// <summary>The point that a probability lies above.</summary>
    /// <param name="probability">The probability above the point, in (0, 1).</param>
    /// <returns>z with P(Z &gt; z) = probability, in (-39, 39).</returns>
    /// <exception cref="ArgumentOutOfRangeException">The probability lies outside (0, 1), or is NaN.</exception>
    public static double UpperQuantile(double probability)
    {
        Check.Inside(probability, 0, 1, nameof(probability));
        if (probability > 0.5)
            return -UpperQuantile(1 - probability);

        return probability > 0.2 ? CentralQuantile(0.5 - probability) : FarQuantile(Elementary.Log(probability));
    }

    /// <summary>ln φ(point).</summary>
    internal static double LogDensity(double point) => -0.5 * point * point - LogRootTwoPi;

    static double CentralQuantile(double central)
    {
        double point = central * RootTwoPi;
        for (int i = 0; i < 20; i++)
        {
            double step = (central - Central(point)) / Density(point);
            point += step;
            if (Math.Abs(step) <= Precision * point)
                return point;
        }

        throw new InvalidOperationException(
            $"The normal quantile at {Check.Text(central)} from the middle did not settle.");
    }

    static double FarQuantile(double logarithm)
    {
        double point = Math.Sqrt(-2 * logarithm - Elementary.Log(-12 * logarithm));
        for (int i = 0; i < Cap; i++)
        {
            double step = (LogUpper(point) - logarithm) * Mills(point);
            point += step;
            if (Math.Abs(step) <= 1e-14 * point)
                return point;
        }

        throw new InvalidOperationException(
            $"The normal quantile of e^{Check.Text(logarithm)} did not settle in {Cap} steps.");
    }

    // exp(-x²/2) with the square exact: at 37 its rounding alone would cost 1e-13.
    static double Density(double point)
    {
        var square = Twofold.Product(point, point);
        return Elementary.Exp(-0.5 * square.Upper) * (1 - 0.5 * square.Lower) / RootTwoPi;
    }

    // P(0 < Z < x) = φ(x) (x + x³/3 + x⁵/15 + …): every term positive.
    static double Central(double point)
    {
        double term = point;
        double sum = point;
        for (int odd = 3; odd < Cap; odd += 2)
        {
            term *= point * point / odd;
            sum += term;
            if (term <= 1e-17 * sum)
                return Density(point) * sum;
        }

        throw new InvalidOperationException($"The normal integral to {Check.Text(point)} did not settle.");
    }

    // 1/(x + 1/(x + 2/(x + 3/(x + …)))): successive convergents enclose the value.
    static double LaplaceFraction(double point)
    {
        double p0 = 0, q0 = 1, p1 = 1, q1 = point;
        for (int n = 1; n < Cap; n++)
        {
            (p0, p1) = (p1, point * p1 + n * p0);
            (q0, q1) = (q1, point * q1 + n * q0);
            if (Math.Abs(p1 * q0 - p0 * q1) <= Precision * p1 * q0)
                return p1 / q1;
            if (q1 > Large)
                (p0, q0, p1, q1) = (p0 / Large, q0 / Large, p1 / Large, q1 / Large);
        }

        throw new InvalidOperationException($"Mills' ratio at {Check.Text(point)} did not settle in {Cap} steps.");
    }
}
