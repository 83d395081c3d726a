namespace Assize.Bounds;

/// <summary>Sine, cosine and angle that give the same bits on every system, as <see cref="Elementary"/> does.</summary>
/// <remarks>Error below 3e-16, relative for small arguments, for angles of magnitude up to 1e7.</remarks>
static class Trigonometry
{
    // π/2 in three parts of 33 bits: together they outlast the cancellation of any angle up to the greatest.
    const double QuarterUpper = 1.57079632673412561417;
    const double QuarterMiddle = 6.07710050630396597660e-11;
    const double QuarterLower = 2.02226624879595063154e-21;
    const double MaximumAngle = 1e7;

    public static double Sine(double angle)
    {
        var (quarter, rest) = Reduce(angle);
        return quarter switch { 0 => SineNear(rest), 1 => CosineNear(rest), 2 => -SineNear(rest), _ =>
            -CosineNear(rest) };
    }

    public static double Cosine(double angle)
    {
        var (quarter, rest) = Reduce(angle);
        return quarter switch { 0 => CosineNear(rest), 1 => -SineNear(rest), 2 => -CosineNear(rest), _ =>
            SineNear(rest) };
    }

    /// <summary>The angle of the point (x, y) from the positive x axis, in [-π, π]; 0 at the origin.</summary>
    public static double Angle(double y, double x)
    {
        double high = Math.Max(Math.Abs(x), Math.Abs(y));
        if (high == 0)
            return 0;

        // Within the first eighth of the circle the tangent is at most 1.
        double eighth = ArcTangent(Math.Min(Math.Abs(x), Math.Abs(y)) / high);
        double quarter = Math.Abs(y) <= Math.Abs(x) ? eighth : Math.PI / 2 - eighth;
        double half = x < 0 ? Math.PI - quarter : quarter;
        return y < 0 ? -half : half;
    }

    static (int Quarter, double Angle) Reduce(double angle)
    {
        Check.Between(angle, -MaximumAngle, MaximumAngle, nameof(angle));
        double quarters = Math.Floor(angle / (Math.PI / 2) + 0.5);
        var upper = Twofold.Product(quarters, QuarterUpper);
        double rest = angle - upper.Upper - upper.Lower - quarters * QuarterMiddle - quarters * QuarterLower;
        return ((int)((long)quarters & 3), rest);
    }

    // Taylor series: |r| ≤ π/4 leaves less than 1e-17 after r^17.
    static double SineNear(double r)
    {
        double z = r * r, sum = 0;
        for (int k = 16; k >= 2; k -= 2)
            sum = (sum + 1) * -z / (k * (k + 1));
        return r + r * sum;
    }

    static double CosineNear(double r)
    {
        double z = r * r, sum = 0;
        for (int k = 17; k >= 3; k -= 2)
            sum = (sum + 1) * -z / (k * (k + 1));
        return 1 - z / 2 * (1 + sum);
    }

    // Half the angle twice, until the tangent is below 0.2.
    static double ArcTangent(double tangent)
    {
        double half = tangent / (1 + Math.Sqrt(1 + tangent * tangent));
        double t = half / (1 + Math.Sqrt(1 + half * half));
        double z = t * t, sum = 0;
        for (int denominator = 25; denominator >= 3; denominator -= 2)
            sum = -z * (1.0 / denominator + sum);
        return 4 * (t + t * sum);
    }
}
