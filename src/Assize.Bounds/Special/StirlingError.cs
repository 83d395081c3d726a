namespace Assize.Bounds;

/// <summary>What Stirling's formula for ln n! leaves out.</summary>
static class StirlingError
{
    // ln n! - ln(√(2πn) (n/e)^n) for n = 1 … 15; `generate.py stirling` in the tests prints them.
    static readonly double[] Small =
    [
        double.NaN,
        0.08106146679532726, 0.0413406959554093, 0.02767792568499834, 0.020790672103765093, 0.016644691189821193,
        0.013876128823070748, 0.01189670994589177, 0.010411265261972096, 0.009255462182712733, 0.00833056343336287,
        0.007573675487951841, 0.00694284010720953, 0.006408994188004207, 0.0059513701127588475, 0.005554733551962801,
    ];

    /// <summary>ln n! - ½ ln(2πn) - n ln n + n for a whole n ≥ 1.</summary>
    public static double Of(double n)
    {
        if (n < Small.Length)
            return Small[(int)n];

        double inverse = 1 / n;
        double z = inverse * inverse;
        double late = 1.0 / 1680 - z * (1.0 / 1188 - z * (691.0 / 360360));
        return inverse * (1.0 / 12 - z * (1.0 / 360 - z * (1.0 / 1260 - z * late)));
    }
}
