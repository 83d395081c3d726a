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

    /// <summary>ln Γ(n + 1) - ½ ln(2πn) - n ln n + n for n > 0; exact to the last place for whole n.</summary>
    public static double Of(double n)
    {
        if (n < Small.Length)
            return n >= 1 && n == Math.Floor(n) ? Small[(int)n] : Shifted(n);

        double inverse = 1 / n;
        double z = inverse * inverse;
        double late = 1.0 / 1680 - z * (1.0 / 1188 - z * (691.0 / 360360));
        return inverse * (1.0 / 12 - z * (1.0 / 360 - z * (1.0 / 1260 - z * late)));
    }

    // Γ(n + 2) = (n + 1) Γ(n + 1) turns each step up into a sum of like signs: (n + ½) ln(1 + 1/n) - 1 ≥ 0.
    static double Shifted(double n)
    {
        double sum = 0;
        for (; n < Small.Length; n++)
            sum += Step(n);
        return sum + Of(n);
    }

    // With s = 1/(2n + 1), (n + ½) ln(1 + 1/n) = artanh(s)/s = 1 + s²/3 + s⁴/5 + …
    static double Step(double n)
    {
        double s = 1 / (2 * n + 1);
        double z = s * s;
        if (z > 0.05)
            return (n + 0.5) * Elementary.LogOnePlus(1 / n) - 1;

        double sum = 0;
        for (int denominator = 27; denominator >= 3; denominator -= 2)
            sum = (sum + 1.0 / denominator) * z;
        return sum;
    }

    /// <summary>The part of ln P(B = k) that does not depend on the rate: a deviance is still to be taken
    /// off.</summary>
    public static double OfBinomial(double n, double k) => k == 0 || k == n
        ? 0
        : Of(n) - Of(k) - Of(n - k) + 0.5 * Elementary.Log(n / (2 * Math.PI * k * (n - k)));
}
