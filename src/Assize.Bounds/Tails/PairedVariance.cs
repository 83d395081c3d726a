namespace Assize.Bounds;

/// <summary>An upper limit on a variance from differences of pairs, when the kurtosis is known to be bounded.</summary>
/// <remarks>
/// <para>Holds for: independent values of one law whose kurtosis is at most <c>kurtosis</c>, taken in pairs; its mean
/// need not be known.</para>
/// <para>Guarantee: the variance exceeds the limit with no more than the given probability, at every number of
/// pairs.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up.</para>
/// <para>Source: the lower tail of a mean of nonnegative values, from e^-u ≤ 1 - u + u²/2; derived on the page.
/// Two-stage use: F. J. Hickernell, L. Jiang, Y. Liu, A. B. Owen (arXiv 1208.4318).</para>
/// </remarks>
public static class PairedVariance
{
    /// <summary>The probability that half the mean square of the pairs' differences falls short of the variance by a
    /// share of it.</summary>
    /// <param name="trials">Number of values, at least 2; of an odd number one is left out.</param>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150]; 3 for a normal law.</param>
    /// <param name="shortfall">The share of the variance, in [0, 1].</param>
    /// <returns>[0, exp(-pairs·shortfall²/(kurtosis + 3))].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double kurtosis, double shortfall)
    {
        Require(trials, kurtosis);
        Check.Probability(shortfall, nameof(shortfall));
        return Enclosure.UpToExponential(trials / 2 * shortfall * shortfall / (kurtosis + 3));
    }

    /// <summary>The share of the variance by which half the mean square may fall short with no more than a given
    /// probability.</summary>
    /// <param name="trials">Number of values, at least 2; of an odd number one is left out.</param>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150].</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>√((kurtosis + 3)·ln(1/risk)/pairs), rounded up; it says nothing from 1 on.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double kurtosis, double risk)
    {
        Require(trials, kurtosis);
        Check.Risk(risk, nameof(risk));
        return Math.Sqrt((kurtosis + 3) * -Elementary.Log(risk) / (trials / 2)) * (1 + Enclosure.Rounding);
    }

    /// <summary>What the variance exceeds with no more than a given probability.</summary>
    /// <param name="trials">Number of values, at least 2; of an odd number one is left out.</param>
    /// <param name="meanSquare">Half the mean of the squared differences of the pairs, in [0, 1e300]; squared unit of
    /// the values.</param>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150].</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>meanSquare/(1 - <see cref="Radius"/>), rounded up; infinite when the radius is 1 or more.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperLimit(long trials, double meanSquare, double kurtosis, double risk)
    {
        Check.Between(meanSquare, 0, 1e300, nameof(meanSquare));
        double shortfall = Radius(trials, kurtosis, risk);
        return shortfall < 1 ? meanSquare / (1 - shortfall) * (1 + Enclosure.Rounding) : double.PositiveInfinity;
    }

    /// <summary>How many values keep the shortfall to a share of the variance with no more than a given probability of
    /// failing.</summary>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150].</param>
    /// <param name="shortfall">The share of the variance, in (0, 1).</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first even number, and every larger one, for which <see cref="Tail"/> is at most the risk,
    /// 2·⌈(kurtosis + 3)·ln(1/risk)/shortfall²⌉; null beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double kurtosis, double shortfall, double risk)
    {
        Require(2, kurtosis);
        Check.Inside(shortfall, 0, 1, nameof(shortfall));
        Check.Risk(risk, nameof(risk));
        double guess = (kurtosis + 3) * -Elementary.Log(risk) / shortfall / shortfall;
        long most = RatePlan.MaximumTrials / 2;
        long pairs = IntegerSearch.First(
            1, most, (long)Math.Min(guess, most), number => Tail(2 * number, kurtosis, shortfall).Upper <= risk);
        return pairs <= most ? 2 * pairs : null;
    }

    static void Require(long trials, double kurtosis)
    {
        Check.AtLeast(trials, 2, nameof(trials));
        Check.Between(kurtosis, 1, 1e150, nameof(kurtosis));
    }
}
