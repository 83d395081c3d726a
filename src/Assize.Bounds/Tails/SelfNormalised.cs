namespace Assize.Bounds;

/// <summary>How far a sum of symmetric values may stray, measured by the values themselves: no moment need
/// exist.</summary>
/// <remarks>
/// <para>Holds for: independent values, each symmetric about the centre; they need not share a law.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; two values of equal size reach it.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up; the formula is 3.18 times the normal tail.</para>
/// <para>Source: V. K. Bentkus and D. Dzindzalieta, Bernoulli 21 (2015) 1231–1237, Theorem 1.1: c = 1/(4·P(Z &gt;
/// √2)).</para>
/// </remarks>
public static class SelfNormalised
{
    // 1/(4 P(Z > √2)) = 3.178655565886997062547…, rounded up.
    const double Constant = 3.178655565886998;

    /// <summary>The probability that the sum of deviations reaches so many root sums of their squares.</summary>
    /// <param name="ratio">Σ(X - centre) / √Σ(X - centre)², in [0, ∞); where all values are the centre, none is
    /// reached.</param>
    /// <returns>[0, 3.1787·P(Z &gt; ratio)], at most 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The ratio is negative, infinite or NaN.</exception>
    public static Enclosure Tail(double ratio)
    {
        Check.Between(ratio, 0, double.MaxValue, nameof(ratio));
        return Enclosure.UpTo(Constant * NormalTail.Upper(ratio));
    }

    /// <summary>The ratio that is reached with no more than a given probability.</summary>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The ratio whose <see cref="Tail"/> is the risk, rounded up; in (0.48, 37.2).</returns>
    /// <exception cref="ArgumentOutOfRangeException">The risk lies outside its domain, or is NaN.</exception>
    public static double Radius(double risk)
    {
        Check.Risk(risk, nameof(risk));
        return NormalTail.UpperQuantile(risk / Constant) * (1 + Enclosure.Rounding);
    }
}
