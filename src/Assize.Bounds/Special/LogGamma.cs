namespace Assize.Bounds;

/// <summary>The logarithm of the gamma function.</summary>
/// <remarks>Relative error below 5e-13, near its zeros at 1 and 2 too.</remarks>
public static class LogGamma
{
    const double OneMinusEuler = 0.4227843350984671394;
    const double LogRootTwoPi = 0.918938533204672741780;

    // ζ(k) - 1 for k = 2, 3, …: mpmath.zeta(k) - 1 at 40 digits.
    static readonly double[] ZetaMinusOne = 
    [
        0.644934066848226436, 0.202056903159594285, 0.0823232337111381915, 0.0369277551433699263,
        0.0173430619844491397, 0.00834927738192282684, 0.00407735619794433938, 0.00200839282608221442,
        0.000994575127818085337, 0.000494188604119464559, 0.000246086553308048299, 0.000122713347578489147,
        0.0000612481350587048293, 0.0000305882363070204936, 0.0000152822594086518717, 7.63719763789976227e-6,
        3.81729326499983986e-6, 1.90821271655393893e-6, 9.53962033872796113e-7, 4.76932986787806463e-7,
        2.3845050272773299e-7, 1.19219925965311073e-7, 5.96081890512594796e-8, 2.98035035146522802e-8,
        1.49015548283650412e-8, 7.45071178983542949e-9, 3.72533402478845705e-9, 1.86265972351304901e-9,
        9.31327432419668183e-10, 4.65662906503378407e-10, 2.32831183367650549e-10, 1.16415501727005198e-10,
        5.82077208790270089e-11, 2.91038504449709969e-11,
    ];

    /// <summary>The logarithm of the gamma function.</summary>
    /// <param name="value">A number in (0, 1e300].</param>
    /// <returns>ln Γ(value).</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value lies outside its domain, or is NaN.</exception>
    public static double Of(double value)
    {
        Check.Between(value, double.Epsilon, 1e300, nameof(value));
        if (value < 0.5)
            return OfOnePlus(value) - Elementary.Log(value);
        if (value <= 1.5)
            return OfOnePlus(value - 1);
        if (value <= 2.5)
            return OfOnePlus(value - 2) + Elementary.LogOnePlus(value - 2);

        return (value - 0.5) * Elementary.Log(value) - value + LogRootTwoPi + StirlingError.Of(value);
    }

    /// <summary>ln Γ(1 + value), accurate however small the value is; value in [-½, ½].</summary>
    internal static double OfOnePlus(double value)
    {
        double sum = 0;
        for (int k = ZetaMinusOne.Length + 1; k >= 2; k--)
            sum = (k % 2 == 0 ? 1 : -1) * ZetaMinusOne[k - 2] / k + sum * value;
        return value * (OneMinusEuler + value * sum) - Elementary.LogOnePlus(value);
    }
}
