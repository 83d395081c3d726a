namespace Assize.Bounds;

/// <summary>How far the sum of independent values in a range may stray from its mean: the best bound of its kind from
/// the range alone.</summary>
/// <remarks>
/// <para>Holds for: independent values in [0, 1] whose means average to <c>mean</c>; values that depend on earlier ones
/// too, if their conditional means do not.</para>
/// <para>Guarantee: at least the true probability, at every number of trials.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up, of a margin 1e-15 smaller; where it is below ½ the formula is
/// at most 2.72 times the probability for yes/no draws.</para>
/// <para>Source: V. Bentkus, Ann. Probab. 32 (2004) 1650–1673; the formula is Markov's inequality after W. Hoeffding,
/// Ann. Math. Statist. 27 (1956) 713–721, on convex functions of sums (both from memory), proved on the page.</para>
/// </remarks>
public static class Bentkus
{
    const long MaximumTrials = 1_000_000_000;

    // Rounding must not lift the level above a value that the sum can take.
    const double LevelRounding = 1e-15;

    // Every term has the rounding of the odds once more than the last; the sums weigh terms a deviation or two away.
    const double SumRounding = 2e-16;

    /// <summary>The probability that the sum of values in [0, 1] reaches a total above its mean.</summary>
    /// <param name="trials">Number of values, in [1, 1e9].</param>
    /// <param name="total">The total, in [0, trials].</param>
    /// <param name="mean">The average of the values' means, in [0, 1].</param>
    /// <returns>[0, E(B - u)₊ / (total - u)] for the best u ≥ trials·mean, B binomial of this mean; [0, 1] up to the
    /// mean of the sum.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure UpperTail(long trials, double total, double mean)
    {
        Require(trials, mean);
        Check.Between(total, 0, trials, nameof(total));
        var middle = Twofold.Product(trials, mean);
        return Above(trials, mean, total - middle.Upper - middle.Lower);
    }

    /// <summary>The probability that the sum of values in [0, 1] falls to a total below its mean.</summary>
    /// <param name="trials">Number of values, in [1, 1e9].</param>
    /// <param name="total">The total, in [0, trials].</param>
    /// <param name="mean">The average of the values' means, in [0, 1].</param>
    /// <returns>The same for the values' distances from 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure LowerTail(long trials, double total, double mean)
    {
        Require(trials, mean);
        Check.Between(total, 0, trials, nameof(total));
        var middle = Twofold.Product(trials, mean);
        return Below(trials, mean, middle.Upper - total + middle.Lower);
    }

    /// <summary>The probability that the average of values in [0, 1] reaches a margin above its mean.</summary>
    /// <param name="trials">Number of values averaged, in [1, 1e9].</param>
    /// <param name="mean">The mean of the average, in [0, 1].</param>
    /// <param name="margin">The margin, in [0, 1].</param>
    /// <returns><see cref="UpperTail"/> at trials·(mean + margin); [0, 0] where that is above trials.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double mean, double margin)
    {
        Require(trials, mean);
        Check.Probability(margin, nameof(margin));
        return margin - (1 - mean) > 1e-15 ? new Enclosure(0, 0) : Above(trials, mean, trials * margin);
    }

    /// <summary>The margin that is exceeded upwards with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, in [1, 1e9].</param>
    /// <param name="mean">The mean of the average, in [0, 1].</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The least margin whose <see cref="Tail"/> is at most the risk, rounded up; at most 1 - mean.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double mean, double risk)
    {
        Require(trials, mean);
        Check.Risk(risk, nameof(risk));
        if (mean == 0)
            return 0;
        if (Tail(trials, mean, 1 - mean).Upper > risk)
            return 1 - mean;

        double wanted = Elementary.Log(risk);
        double Missing(double margin) => Elementary.Log(Tail(trials, mean, margin).Upper) - wanted;
        double greatest = Math.Min(1 - mean, Hoeffding.Radius(trials, 1, risk));
        if (Missing(greatest) > 0)
            greatest = 1 - mean;

        return Math.Min(1 - mean, RootBracket.Descent(Missing, greatest, 1e-13) * (1 + Enclosure.Rounding));
    }

    /// <summary>How many values in [0, 1] the average needs so that a margin is exceeded upwards with no more than a
    /// given probability.</summary>
    /// <param name="mean">The mean of the average, in (0, 1).</param>
    /// <param name="margin">The margin, in (0, 1 - mean].</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number for which <see cref="Tail"/> is at most the risk; every larger one keeps the risk too.
    /// Null beyond 1e9.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double mean, double margin, double risk)
    {
        Check.Inside(mean, 0, 1, nameof(mean));
        Check.Between(margin, double.Epsilon, 1 - mean, nameof(margin));
        Check.Risk(risk, nameof(risk));

        // An average of more draws is a conditional mean of averages of fewer: by Jensen the formula never rises.
        double guess = -0.9 * Elementary.Log(risk) / Divergence.Bernoulli(Math.Min(1, mean + margin), mean);
        long found = IntegerSearch.First(
            1, MaximumTrials, (long)Math.Min(guess, MaximumTrials), trials => Tail(trials, mean, margin).Upper <= risk);
        return found <= MaximumTrials ? found : null;
    }

    static void Require(long trials, double mean)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, MaximumTrials, nameof(trials));
        Check.Probability(mean, nameof(mean));
    }

    static Enclosure Above(long trials, double mean, double excess) => mean is 0 or 1
        ? new Enclosure(0, excess > 0 ? 0 : 1)
        : Best(limit => BinomialMoments.From(trials, limit, mean), trials, trials * mean, excess);

    static Enclosure Below(long trials, double mean, double excess) => mean is 0 or 1
        ? new Enclosure(0, excess > 0 ? 0 : 1)
        : Best(limit => BinomialMoments.OfFailures(trials, limit, mean), trials, trials * (1 - mean), excess);

    // Between whole numbers E(B - u)₊/(level - u) is monotone in u, and it falls while E(B | B > u) is below the level.
    static Enclosure Best(Func<long, BinomialMoments> moments, long trials, double mean, double distance)
    {
        if (!(distance > 0))
            return new Enclosure(0, 1);

        double excess = distance * (1 - LevelRounding);

        long least = (long)Math.Max(1, Math.Ceiling(mean));
        long most = (long)Math.Min(trials - 1, Math.Floor(mean + excess));
        double variance = mean * (1 - mean / trials);
        long guess = (long)(mean + excess - Math.Min(excess, variance / excess));
        long u = IntegerSearch.First(least, most, guess, u => Passes(moments(u + 1), excess));
        double ratio = u <= least ? FromMean(moments(least), excess) : 1;
        if (least <= most)
            ratio = Math.Min(ratio, FromOneBelow(moments(Math.Min(u, most) + 1), excess));

        return Enclosure.UpTo(ratio * (1 + SumRounding * Math.Sqrt(trials)));
    }

    static bool Passes(BinomialMoments beyond, double excess) =>
        beyond.Sum1 >= (excess - beyond.Above) * beyond.Sum0;

    static double FromOneBelow(BinomialMoments beyond, double excess)
    {
        double distance = excess - beyond.Above + 1;
        return distance > 0 ? Elementary.Exp(beyond.Mass) * (beyond.Sum0 + beyond.Sum1) / distance : 1;
    }

    // At u = mean; or at the limit itself, where a rounded mean has put it a little below the true one.
    static double FromMean(BinomialMoments from, double excess)
    {
        double above = Math.Max(0, from.Above);
        return Elementary.Exp(from.Mass) * (from.Sum1 + above * from.Sum0) / (excess - from.Above + above);
    }

    sealed class OfMeans : MeanTheorem
    {
        const long MostTrials = 1_000_000_000;

        public override bool IsCostly => true;

        public override string Name => "Bentkus";

        public override string Assumes => "independent draws in a range";

        public override bool Applies(MeanFacts facts) => facts.Range is not null;

        // Binomials of a greater rate dominate those of a smaller one: the edge is the worst case.
        public override double Beyond(MeanFacts facts, long trials, double mean, double margin)
        {
            double range = facts.Range!.Value;
            double share = Math.Max(0, (mean - facts.Minimum!.Value) / range);
            double above = margin / range * (1 - 1e-14);
            if (trials > MostTrials || !(above > 0))
                return 1;

            return share + above > 1 ? 0 : Tail(trials, share, above).Upper;
        }
    }
}
