namespace Assize.Bounds;

/// <summary>The even part of Legendre's continued fraction for the upper incomplete gamma function.</summary>
static class GammaFraction
{
    const int Cap = 1_000_000;
    const double Precision = 1e-16;
    const double Large = 1e120;

    /// <summary>Γ(a, x) / (x^a e^-x) = 1/(x + 1 - a - 1(1 - a)/(x + 3 - a - 2(2 - a)/(x + 5 - a - …))).</summary>
    public static double Of(double shape, double point)
    {
        double offset = point - shape;
        double p0 = 0, q0 = 1, p1 = 1, q1 = offset + 1;
        for (int n = 1; n < Cap; n++)
        {
            double numerator = n * (shape - n);
            double denominator = offset + (2 * n + 1);
            (p0, p1) = (p1, denominator * p1 + numerator * p0);
            (q0, q1) = (q1, denominator * q1 + numerator * q0);
            if (Math.Abs(p1 * q0 - p0 * q1) <= Precision * Math.Abs(p1 * q0))
                return p1 / q1;
            if (Math.Abs(q1) > Large)
                (p0, q0, p1, q1) = (p0 / Large, q0 / Large, p1 / Large, q1 / Large);
        }

        throw new InvalidOperationException(
            $"The gamma fraction of shape {Check.Text(shape)} at {Check.Text(point)} did not settle in {Cap} steps.");
    }
}
