namespace Assize.Bounds;

/// <summary>The regularised incomplete beta function for real parameters.</summary>
/// <remarks>
/// Relative error below 5e-13 while the result is above 1e-300, for parameters from ½ to 1e9. Whole counts of trials
/// are served by <see cref="Binomial"/>.
/// Source: A. R. Didonato and A. H. Morris, ACM Trans. Math. Softw. 18 (1992) 360–373.
/// </remarks>
static class IncompleteBeta
{
    /// <summary>ln I_x(a, b), where other = 1 - x and excess = b·x - a·other are given without cancellation; excess ≤
    /// 0.</summary>
    public static double LogLower(double a, double b, double x, double other, double excess)
    {
        double n = a + b;
        double deviance = CountDeviance.Of(a, excess, n * x) + CountDeviance.Of(b, -excess, n * other);
        double exponent = StirlingError.Of(n) - StirlingError.Of(a) - StirlingError.Of(b) - deviance;
        double fraction = BetaFraction.TailOverMass(a, b - 1, x, other, excess - x) / (a * other);
        return exponent + Elementary.Log(Math.Sqrt(a / n * b / (2 * Math.PI)) * fraction);
    }
}
