namespace Assize.Bounds;

/// <summary>How far the average of independent values of known spread may stray above its mean: the best bound of its
/// kind.</summary>
/// <remarks>
/// <para>Holds for: independent values, each at most <c>bound</c> above its mean, their variances averaging to at most
/// <c>variance</c>; for martingale differences too.</para>
/// <para>Guarantee: at least the true probability, at every number of trials.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up, of a margin 1e-15 smaller; the formula is at most 3.7 times
/// the probability for two-point draws.</para>
/// <para>Source: V. Bentkus, Ann. Probab. 32 (2004) 1650–1673, Theorem 1.1 (from memory); I. Pinelis, IMS LNMS
/// 51 (2006) 33–52, abstract.</para>
/// </remarks>
public static class BentkusVariance
{
    const long MaximumTrials = 1_000_000_000;

    // Every term has the rounding of the odds once more than the last; the sums weigh terms a deviation or two away.
    const double SumRounding = 2e-16;

    // Rounding must not lift the level above a value that the sum of two-point values can take.
    const double LevelRounding = 1e-15;

    /// <summary>The probability that the average reaches a margin above its mean.</summary>
    /// <param name="trials">Number of values averaged, in [1, 1e9].</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [0, ∞); unit of the values.</param>
    /// <returns>[0, E(T - u)₊² / (n·margin - u)²] for the best u ≥ 0 or for u = -∞ (Cantelli), T the sum of n values
    /// bound and -variance/bound of mean 0; [0, 0] beyond the bound.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double variance, double bound, double margin)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, MaximumTrials, nameof(trials));
        Require(variance, bound);
        Check.Between(margin, 0, double.MaxValue, nameof(margin));
        if (margin > bound)
            return new Enclosure(0, 0);

        // T = (B - n·rate)·step: all in steps from here on.
        double ratio = variance / bound;
        double step = ratio + bound;
        double excess = trials * (margin / step) * (1 - LevelRounding);
        double cantelli = 1 / (1 + trials * (margin * margin / variance));
        if (excess == 0 || step > double.MaxValue)
            return Enclosure.UpTo(cantelli);

        double rate = Math.Max(1e-300, ratio / step);
        double other = Math.Max(1e-300, bound / step);
        BinomialMoments Moments(long limit) => rate <= 0.5
            ? BinomialMoments.From(trials, limit, rate)
            : BinomialMoments.OfFailures(trials, limit, other);

        double rounding = 1 + SumRounding * Math.Sqrt(trials);
        return Enclosure.UpTo(Math.Min(cantelli, Least(Moments, trials, trials * rate, excess) * rounding));
    }

    /// <summary>The margin that is exceeded upwards with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, in [1, 1e9].</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The least margin whose <see cref="Tail"/> is at most the risk, rounded up; at most the bound.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double variance, double bound, double risk)
    {
        Check.Risk(risk, nameof(risk));
        if (Tail(trials, variance, bound, bound).Upper > risk)
            return bound;

        double wanted = Elementary.Log(risk);
        double Missing(double margin) => Elementary.Log(Tail(trials, variance, bound, margin).Upper) - wanted;
        double greatest = Math.Min(bound, Bernstein.Radius(trials, variance, bound, risk));
        if (Missing(greatest) > 0)
            greatest = bound;

        return Math.Min(bound, RootBracket.Descent(Missing, greatest, 1e-13) * (1 + Enclosure.Rounding));
    }

    /// <summary>How many values the average needs so that a margin is exceeded upwards with no more than a given
    /// probability.</summary>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in (0, ∞); unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number for which <see cref="Tail"/> is at most the risk; every larger one keeps the risk too.
    /// Null beyond 1e9.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double variance, double bound, double margin, double risk)
    {
        Require(variance, bound);
        Check.Between(margin, double.Epsilon, double.MaxValue, nameof(margin));
        Check.Risk(risk, nameof(risk));

        // An average of more draws is a conditional mean of averages of fewer: by Jensen the formula never rises.
        double guess = -2 * Elementary.Log(risk) * (variance / margin + bound / 3) / margin;
        long found = IntegerSearch.First(
            1,
            MaximumTrials,
            (long)Math.Min(guess, MaximumTrials),
            trials => Tail(trials, variance, bound, margin).Upper <= risk);
        return found <= MaximumTrials ? found : null;
    }

    static void Require(double variance, double bound)
    {
        Check.Between(variance, 1e-300, 1e300, nameof(variance));
        Check.Between(bound, 1e-150, 1e150, nameof(bound));
    }

    // With v = mean + u: E(B - v)₊²/(level - v)² falls until E(B - v)₊²/E(B - v)₊ passes level - v, and then rises.
    static double Least(Func<long, BinomialMoments> moments, long trials, double mean, double excess)
    {
        long least = (long)Math.Max(1, Math.Ceiling(mean));
        long most = (long)Math.Min(trials, Math.Floor(mean + excess));
        double variance = mean * (1 - mean / trials);
        long guess = (long)(mean + excess - Math.Min(excess, 2 * variance / excess));
        long cell = IntegerSearch.First(least, most, guess, v => v == trials || Rises(moments(v + 1), excess));
        return InCell(moments(Math.Max(least, Math.Min(cell, most))), excess);
    }

    static bool Rises(BinomialMoments beyond, double excess)
    {
        double distance = excess - beyond.Above + 1;
        double first = beyond.Sum0 + beyond.Sum1;
        double second = beyond.Sum0 + 2 * beyond.Sum1 + beyond.Sum2;
        return second >= first * distance;
    }

    // The least over v in [limit - 1, limit], not below the mean; every v gives a valid bound.
    static double InCell(BinomialMoments from, double excess)
    {
        double gap = excess - from.Above;
        double first = from.Sum1 - gap * from.Sum0;
        double second = from.Sum2 - 2 * gap * from.Sum1 + gap * gap * from.Sum0;
        double best = first < 0 ? -second / first : double.MaxValue;
        double distance = Math.Min(Math.Min(gap + 1, excess), Math.Max(gap, best));
        double start = distance - gap;
        double square = from.Sum2 + 2 * start * from.Sum1 + start * start * from.Sum0;
        return Elementary.Exp(from.Mass) * square / distance / distance;
    }

    sealed class OfMeans : MeanTheorem
    {
        public override bool IsCostly => true;

        public override string Name => "Bentkus, from a variance";

        public override string Assumes => "independent draws in a range, of bounded standard deviation";

        public override bool Applies(MeanFacts facts) => facts is { Range: not null, StandardDeviation: not null };

        public override double Beyond(MeanFacts facts, long trials, double mean, double margin)
        {
            double deviation = facts.StandardDeviation!.Value;
            return trials > 1_000_000_000 || !(margin > 0) ? 1 : Tail(trials, deviation * deviation, BoundAbove(facts, mean), margin).Upper;
        }
    }
}
