namespace Assize.Bounds;

/// <summary>The upper tail of a gamma law of shape and point below 1, where the tail can be small only because the
/// shape is.</summary>
static class SmallUpper
{
    /// <summary>ln Q: Q = (1 - x^a / Γ(a + 1)) - x^a / Γ(a + 1) · a Σ_{k≥1} (-x)^k / (k! (a + k)), both parts
    /// positive.</summary>
    public static double Log(double shape, double point)
    {
        double exponent = shape * Elementary.Log(point) - LogGammaOnePlus(shape);
        double alternating = 0, power = 1;
        for (int k = 1; k <= 40; k++)
        {
            power *= -point / k;
            alternating += power / (shape + k);
        }

        return Elementary.Log(-Elementary.ExpMinusOne(exponent) - Elementary.Exp(exponent) * shape * alternating);
    }

    // Γ(a + 1) = a Γ(a) brings a shape above ½ back into the series' range.
    static double LogGammaOnePlus(double shape) =>
        shape <= 0.5 ? LogGamma.OfOnePlus(shape) : LogGamma.OfOnePlus(shape - 1) + Elementary.Log(shape);
}
