namespace Assize.Bounds;

/// <summary>The points that a gamma law of scale 1 exceeds, or falls short of, with a small probability.</summary>
static class GammaQuantile
{
    public const double LeastProbability = 1e-140;

    /// <summary>Two neighbouring points around the one with P(X > point) = probability ≤ ½, for a shape of at least
    /// ½.</summary>
    public static (double Lower, double Upper) AroundUpper(double shape, double probability)
    {
        double wanted = Elementary.Log(probability);
        var (lower, upper) = RootBracket.Find(
            x => IncompleteGamma.LogUpperTail(shape, Elementary.Exp(x)) - wanted,
            Least(shape, probability), Most(shape), 4e-16);
        return (Elementary.Exp(lower), Elementary.Exp(upper));
    }

    /// <summary>Two neighbouring points around the one with P(X ≤ point) = probability ≤ ½, for a shape of at least
    /// ½.</summary>
    public static (double Lower, double Upper) AroundLower(double shape, double probability)
    {
        double wanted = Elementary.Log(probability);
        var (lower, upper) = RootBracket.Find(
            x => IncompleteGamma.LogLowerTail(shape, Elementary.Exp(x)) - wanted,
            Least(shape, probability), Most(shape), 4e-16);
        return (Elementary.Exp(lower), Elementary.Exp(upper));
    }

    // P(X ≤ x) ≤ x^a / Γ(a + 1), and ln Γ(a + 1) ≥ -0.58 a.
    static double Least(double shape, double probability) => Elementary.Log(probability) / shape - 1;

    // Chernoff: P(X > x) ≤ exp(a - x + a ln(x/a)) is below 1e-280 here.
    static double Most(double shape) => Elementary.Log(4 * shape + 2000);
}
