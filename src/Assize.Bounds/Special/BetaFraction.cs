namespace Assize.Bounds;

/// <summary>The continued fraction of the incomplete beta function in its even part, for counts beyond the
/// mode.</summary>
/// <remarks>A. R. Didonato and A. H. Morris, ACM Trans. Math. Softw. 18 (1992) 360–373, eq. 9. A plain fraction lost
/// up to 1e-7.</remarks>
static class BetaFraction
{
    const int Cap = 1_000_000;
    const double Precision = 1e-16;
    const double Large = 1e120;

    /// <summary>P(S ≥ successes) / P(S = successes), where successes ≥ (trials + 1) · rate and meanExcess = trials ·
    /// rate - successes.</summary>
    public static double TailOverMass(double successes, double failures, double rate, double other, double meanExcess)
    {
        double a = successes;
        double b = failures + 1;
        double lambda = other - meanExcess;
        double below = 1 / (a + 1);
        double p0 = 0, q0 = 1, p1 = 1, q1 = a * lambda * below;
        for (int n = 1; n < Cap; n++)
        {
            double above = 1 / (a + 2 * n + 1);
            double step = n * (b - n) * rate * below;
            double numerator = (a + n - 1) * (a + b + n - 1) * rate * below * step;
            double denominator = n + step + (a + n) * (lambda + n * (1 + other)) * above;
            (p0, p1) = (p1, denominator * p1 + numerator * p0);
            (q0, q1) = (q1, denominator * q1 + numerator * q0);
            if (Math.Abs(p1 * q0 - p0 * q1) <= Precision * p1 * q0)
                return a * other * (p1 / q1);

            below = above;
            if (q1 > Large)
                (p0, q0, p1, q1) = (p0 / Large, q0 / Large, p1 / Large, q1 / Large);
        }

        throw new InvalidOperationException(
            $"The tail of {Check.Text(successes)} successes and {Check.Text(failures)} failures "
            + $"at rate {Check.Text(rate)} did not settle in {Cap} steps.");
    }
}
