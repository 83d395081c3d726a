namespace Assize.Bounds;

/// <summary>How far the average of independent values in a range may stray from its mean.</summary>
/// <remarks>
/// <para>Holds for: independent values in a known range; they need not share a distribution, only the average of
/// their means counts.</para>
/// <para>Guarantee: at least the true probability, at every number of trials.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up; the formula itself is 6 to 15 times the probability for
/// yes/no draws.</para>
/// <para>Source: W. Hoeffding, J. Amer. Statist. Assoc. 58 (1963) 13–30, Theorem 1, (2.1) and (2.3), and Theorem
/// 2.</para>
/// </remarks>
public static class Hoeffding
{
    /// <summary>The probability that the average of values in [0, 1] reaches a level above its mean.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="level">The level, in [<paramref name="mean"/>, 1].</param>
    /// <param name="mean">The mean of the average, in [0, 1].</param>
    /// <returns>[0, exp(-trials · KL(level ‖ mean))].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure UpperTail(long trials, double level, double mean)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Probability(mean, nameof(mean));
        Check.Between(level, mean, 1, nameof(level));
        return Enclosure.UpToExponential(trials * Divergence.Bernoulli(level, mean));
    }

    /// <summary>The probability that the average of values in [0, 1] falls to a level below its mean.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="level">The level, in [0, <paramref name="mean"/>].</param>
    /// <param name="mean">The mean of the average, in [0, 1].</param>
    /// <returns>[0, exp(-trials · KL(level ‖ mean))].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure LowerTail(long trials, double level, double mean)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Probability(mean, nameof(mean));
        Check.Between(level, 0, mean, nameof(level));
        return Enclosure.UpToExponential(trials * Divergence.Bernoulli(level, mean));
    }

    /// <summary>The probability that the average of values in any range strays from its mean to one side.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="range">Greatest minus least possible value, in (0, ∞); same unit as the values.</param>
    /// <param name="margin">The distance from the mean, in [0, ∞); same unit as the values.</param>
    /// <returns>[0, exp(-2 · trials · (margin / range)²)].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double range, double margin)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(range, double.Epsilon, double.MaxValue, nameof(range));
        Check.Between(margin, 0, double.MaxValue, nameof(margin));
        double share = margin / range;
        return Enclosure.UpToExponential(2.0 * trials * share * share);
    }

    /// <summary>The margin that is exceeded to one side with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="range">Greatest minus least possible value, in (0, ∞); same unit as the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>range · √(ln(1/risk) / (2 · trials)), rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double range, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(range, double.Epsilon, double.MaxValue, nameof(range));
        Check.Risk(risk, nameof(risk));
        return range * Math.Sqrt(-Elementary.Log(risk) / (2.0 * trials)) * (1 + Enclosure.Rounding);
    }

    /// <summary>How many values the average needs so that a margin is exceeded to one side with no more than a given
    /// probability.</summary>
    /// <param name="range">Greatest minus least possible value, in (0, ∞); same unit as the values.</param>
    /// <param name="margin">The distance from the mean, in (0, ∞); same unit as the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="Tail"/> is at most the risk; null beyond
    /// 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double range, double margin, double risk)
    {
        Check.Between(range, double.Epsilon, double.MaxValue, nameof(range));
        Check.Between(margin, double.Epsilon, double.MaxValue, nameof(margin));
        Check.Risk(risk, nameof(risk));
        double share = range / margin;
        double guess = -Elementary.Log(risk) * share * share / 2;
        return RateTheorem.First(guess, trials => Tail(trials, range, margin).Upper <= risk);
    }

    sealed class OfRates : RateTheorem
    {
        public override string Name => "Hoeffding";

        public override string Assumes => "independent trials whose rates average to the claimed one";

        public override long? TrialsNeeded(RatePlan plan, IReadOnlyList<RateSide> sides) =>
            Greatest(sides, side => ChernoffTrials.Ceiling(side, plan.Miss));
    }

    sealed class OfMeans : MeanTheorem
    {
        public override string Name => "Hoeffding";

        public override string Assumes => "independent draws in a range";

        public override bool Applies(MeanFacts facts) => facts.Range is not null;

        // The divergence from a level to a mean below it grows as the mean falls: the edge is the worst case.
        public override double Beyond(MeanFacts facts, long trials, double mean, double margin)
        {
            double range = facts.Range!.Value;
            double share = (mean - facts.Minimum!.Value) / range;
            double level = (mean + margin - facts.Minimum.Value) / range * (1 - 1e-15);
            if (level <= share)
                return 1;
            return level > 1 ? 0 : UpperTail(trials, level, Math.Max(0, share)).Upper;
        }
    }
}
