namespace Assize.Bounds;

/// <summary>Hoeffding's bound for values of known spread: sharper than Bennett's, and in closed form.</summary>
/// <remarks>
/// <para>Holds for: independent values, each at most <c>bound</c> above its mean, their variances averaging to at most
/// <c>variance</c>.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; never above Bennett's.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up.</para>
/// <para>Source: W. Hoeffding, J. Amer. Statist. Assoc. 58 (1963) 13–30, Theorem 3; from memory.</para>
/// </remarks>
public static class HoeffdingVariance
{
    /// <summary>The probability that the average reaches a margin above its mean.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [0, ∞); unit of the values.</param>
    /// <returns>[0, exp(-n·KL((v + bound·margin)/(v + bound²) ‖ v/(v + bound²)))] with v the variance; [0, 0] beyond
    /// the bound.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double variance, double bound, double margin)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(variance, bound);
        Check.Between(margin, 0, double.MaxValue, nameof(margin));
        return margin > bound
            ? new Enclosure(0, 0)
            : Enclosure.UpToExponential(trials * Exponent(variance, bound, margin));
    }

    /// <summary>The margin that is exceeded upwards with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The least margin whose <see cref="Tail"/> is at most the risk, rounded up; at most the bound.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double variance, double bound, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(variance, bound);
        Check.Risk(risk, nameof(risk));

        double share = -Elementary.Log(risk) / trials;
        double Missing(double margin) => share - Exponent(variance, bound, margin);
        double greatest = Math.Min(bound, Bernstein.Radius(trials, variance, bound, risk));
        return Missing(greatest) > 0
            ? bound
            : Math.Min(bound, RootBracket.Descent(Missing, greatest, 1e-13) * (1 + Enclosure.Rounding));
    }

    /// <summary>How many values the average needs so that a margin is exceeded upwards with no more than a given
    /// probability.</summary>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in (0, ∞); unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="Tail"/> is at most the risk; null beyond
    /// 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double variance, double bound, double margin, double risk)
    {
        Require(variance, bound);
        Check.Between(margin, double.Epsilon, double.MaxValue, nameof(margin));
        Check.Risk(risk, nameof(risk));
        double guess = -Elementary.Log(risk) / Exponent(variance, bound, Math.Min(margin, bound));
        return RateTheorem.First(guess, trials => Tail(trials, variance, bound, margin).Upper <= risk);
    }

    static void Require(double variance, double bound)
    {
        Check.Between(variance, 1e-300, 1e300, nameof(variance));
        Check.Between(bound, 1e-150, 1e150, nameof(bound));
    }

    // A greater rate bounds from above too, so a rate that would underflow is raised; an infinite one says nothing.
    static double Exponent(double variance, double bound, double margin)
    {
        double ratio = variance / bound;
        double whole = ratio + bound;
        if (margin == 0 || whole > double.MaxValue)
            return 0;

        double rate = Math.Max(1e-300, ratio / whole);
        double excess = margin / whole;
        return Divergence.Between(rate + excess, (bound - margin) / whole, rate, bound / whole, excess);
    }
}
