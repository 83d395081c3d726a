namespace Assize.Bounds;

/// <summary>Exact confidence limits for the mean of a Poisson count.</summary>
/// <remarks>
/// Rounded outwards: a limit is at least as far from the count as the true one, by a relative 2e-12 at most.
/// Source: F. Garwood, Biometrika 28 (1936) 437–442.
/// </remarks>
public static class PoissonLimits
{
    const long MaximumCount = 1_000_000_000;

    // The tail is known to 5e-13 and is at least as steep as its argument to the power of ln 2.
    const double Outwards = 1e-12;

    /// <summary>The lower limit for the mean.</summary>
    /// <param name="count">The count, in [0, 1e9].</param>
    /// <param name="risk">The probability that the limit is above the mean, in [1e-140, ½].</param>
    /// <returns>The mean at which such a count or a greater one has probability risk, in [0, ∞); 0 for a count of
    /// 0.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Lower(long count, double risk)
    {
        Require(count, risk);
        return count == 0 ? 0 : GammaQuantile.AroundLower(count, risk).Lower * (1 - Outwards);
    }

    /// <summary>The upper limit for the mean.</summary>
    /// <param name="count">The count, in [0, 1e9].</param>
    /// <param name="risk">The probability that the limit is below the mean, in [1e-140, ½].</param>
    /// <returns>The mean at which such a count or a smaller one has probability risk, in (0, ∞).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Upper(long count, double risk)
    {
        Require(count, risk);
        return GammaQuantile.AroundUpper(count + 1, risk).Upper * (1 + Outwards);
    }

    static void Require(long count, double risk)
    {
        Check.AtLeast(count, 0, nameof(count));
        Check.AtMost(count, MaximumCount, nameof(count));
        Check.Between(risk, GammaQuantile.LeastProbability, 0.5, nameof(risk));
    }
}
