namespace Assize.Bounds;

/// <summary>The incomplete gamma functions of a large shape, where series and fraction take as many steps as its
/// root.</summary>
/// <remarks>
/// In units u of the law's own spread √m, m = a - 1, both are ∫ exp(-βu - u²/2 + m Σ (-1)^(j+1) vʲ/j, j ≥ 3) du over
/// u > 0 with v = ±u/√m: the substitution t = x ± xu/√m in ∫ t^(a-1) e^-t dt. Smooth and positive, so that Gauss and
/// Legendre's rule has it to the last places.
/// </remarks>
static class GammaIntegral
{
    /// <summary>From this shape on, the powers left out are below 1e-16.</summary>
    public const double LeastShape = 1e5;

    const int Powers = 12;

    // Beyond it the integrand is below e^-40 of its greatest value.
    const double Depth = 41;

    // Enough for e^(-41 t) and e^(-41 t²) on [0, 1] to 1e-20.
    static readonly GaussLegendre Rule = new(40);

    /// <summary>Γ(a, x) / (x^a e^-x), for points from one spread below the shape on.</summary>
    public static double Upper(double shape, double point) => Over(shape, point, 1);

    /// <summary>γ(a, x) / (x^a e^-x), for points up to two spreads above the shape.</summary>
    public static double Lower(double shape, double point) => Over(shape, point, -1);

    static double Over(double shape, double point, int side)
    {
        double power = shape - 1, root = Math.Sqrt(power);
        double slope = side * (point - shape + 1) / root;
        double end = 2 * Depth / (slope + Math.Sqrt(slope * slope + 2 * Depth));
        return Rule.Integrate(
            u => Elementary.Exp(-u * (slope + u / 2) + power * Rest(side * u / root)), 0, end) / root;
    }

    // ln(1 + v) - v + v²/2.
    static double Rest(double v)
    {
        double sum = 0;
        for (int j = Powers; j >= 3; j--)
            sum = 1.0 / j - v * sum;
        return v * v * v * sum;
    }
}
