namespace Assize.Bounds;

/// <summary>How far the average of independent values of known spread may stray above its mean when none can exceed it
/// by much.</summary>
/// <remarks>
/// <para>Holds for: independent values, each at most <c>bound</c> above its mean, their variances averaging to at most
/// <c>variance</c>.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; never above Bernstein's.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up.</para>
/// <para>Source: G. Bennett, J. Amer. Statist. Assoc. 57 (1962) 33–45, eq. (8b); from memory.</para>
/// </remarks>
public static class Bennett
{
    /// <summary>The probability that the average reaches a margin above its mean.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [0, ∞); unit of the values.</param>
    /// <returns>[0, exp(-(n·variance/bound²)·h(bound·margin/variance))], h(u) = (1 + u) ln(1 + u) - u.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double variance, double bound, double margin)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(variance, bound);
        Check.Between(margin, 0, double.MaxValue, nameof(margin));
        return Enclosure.UpToExponential(trials * Exponent(variance, bound, margin));
    }

    /// <summary>The margin that is exceeded upwards with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The least margin whose <see cref="Tail"/> is at most the risk, rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double variance, double bound, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(variance, bound);
        Check.Risk(risk, nameof(risk));

        // Bernstein's radius is never smaller, since h(u) ≥ u²/(2 + 2u/3).
        double share = -Elementary.Log(risk) / trials;
        double greatest = Bernstein.Radius(trials, variance, bound, risk);
        double radius = RootBracket.Descent(margin => share - Exponent(variance, bound, margin), greatest, 1e-13);
        return radius * (1 + Enclosure.Rounding);
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
        double guess = -Elementary.Log(risk) / Exponent(variance, bound, margin);
        return RateTheorem.First(guess, trials => Tail(trials, variance, bound, margin).Upper <= risk);
    }

    static void Require(double variance, double bound)
    {
        Check.Between(variance, 1e-300, 1e300, nameof(variance));
        Check.Between(bound, 1e-150, 1e150, nameof(bound));
    }

    // (variance/bound²)·h(u), u = bound·margin/variance, written so that no intermediate value leaves the range.
    static double Exponent(double variance, double bound, double margin)
    {
        double u = Math.Min(1e300, margin / variance * bound);
        if (u < 1e-20)
            return margin / variance * margin / 2;

        // h(u) = (1 + u)(w - ln(1 + w)) with w = -u/(1 + u): no cancellation for small u.
        return u < 1
            ? margin / bound * ((1 + u) * Elementary.LogShortfall(-u / (1 + u)) / u)
            : ((variance / bound + margin) * Elementary.LogOnePlus(u) - margin) / bound;
    }

    sealed class OfMeans : MeanTheorem
    {
        public override string Name => "Bennett";

        public override string Assumes => "independent draws in a range, of bounded standard deviation";

        public override bool Applies(MeanFacts facts) => facts is { Range: not null, StandardDeviation: not null };

        public override double Beyond(MeanFacts facts, long trials, double mean, double margin)
        {
            double deviation = facts.StandardDeviation!.Value;
            return !(margin > 0) ? 1 : Tail(trials, deviation * deviation, BoundAbove(facts, mean), margin).Upper;
        }
    }
}
