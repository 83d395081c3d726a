namespace Assize.Bounds;

/// <summary>How often one draw lies beyond a point.</summary>
static class OneDraw
{
    const double Rounding = 1e-11;

    /// <summary>P(draw &gt; point), or P(draw ≥ point) when the point itself counts.</summary>
    public static Enclosure Above(Law law, double point, bool withPoint) => law switch
    {
        Affine { Parts: var (inner, scale, shift) } => scale > 0
            ? Above(inner, (point - shift) / scale, withPoint)
            : Below(inner, (point - shift) / scale, withPoint),
        Slopes slopes => Around(1 - slopes.UpTo(point)),
        _ => SumTail.Above(Draws.Of(law, 1), point, withPoint),
    };

    /// <summary>P(draw &lt; point), or P(draw ≤ point) when the point itself counts.</summary>
    public static Enclosure Below(Law law, double point, bool withPoint) => law switch
    {
        Affine { Parts: var (inner, scale, shift) } => scale > 0
            ? Below(inner, (point - shift) / scale, withPoint)
            : Above(inner, (point - shift) / scale, withPoint),
        Slopes slopes => Around(slopes.UpTo(point)),
        _ => SumTail.Below(Draws.Of(law, 1), point, withPoint),
    };

    // A share near 0 by subtraction keeps its absolute error only.
    static Enclosure Around(double probability) => new(
        Math.Max(0, probability * (1 - Rounding) - 1e-15), Math.Min(1, probability * (1 + Rounding) + (probability > 0 ? 1e-15 : 0)));
}
