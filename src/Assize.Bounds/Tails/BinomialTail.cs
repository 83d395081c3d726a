namespace Assize.Bounds;

/// <summary>How often independent yes/no trials of one rate give so many successes.</summary>
/// <remarks>
/// <para>Holds for: independent trials that succeed with the same rate.</para>
/// <para>Guarantee: the true probability lies inside the enclosure, at every number of trials.</para>
/// <para>Accuracy: the ends differ from the truth by at most 1.5e-12 of it while it is above 1e-300.</para>
/// <para>Source: J. Bernoulli, Ars conjectandi (1713), part 1; evaluated after C. Loader, Fast and accurate
/// computation of binomial
/// probabilities (2000), and A. R. Didonato and A. H. Morris, ACM Trans. Math. Softw. 18 (1992) 360–373.</para>
/// </remarks>
public static class BinomialTail
{
    internal const string Name = "exact binomial";

    // Twice the accuracy that is tested against 80-digit arithmetic.
    const double Rounding = 1e-12;

    /// <summary>The probability of so many successes or more.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Least number of successes; any whole number below 2^53.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>An enclosure of P(S ≥ successes).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure UpperTail(long trials, long successes, double rate) =>
        Widened(
            Binomial.UpperTail(trials, successes, rate),
            known: successes <= 0 || successes > trials || rate is 0 or 1);

    /// <summary>The probability of so many successes or fewer.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Greatest number of successes; any whole number below 2^53.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>An enclosure of P(S ≤ successes).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure LowerTail(long trials, long successes, double rate) =>
        Widened(
            Binomial.LowerTail(trials, successes, rate),
            known: successes < 0 || successes >= trials || rate is 0 or 1);

    /// <summary>The probability of a number of successes between two limits.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="low">Least number of successes.</param>
    /// <param name="high">Greatest number of successes, at least <paramref name="low"/> - 1.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>An enclosure of P(low ≤ S ≤ high).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Between(long trials, long low, long high, double rate)
    {
        Check.AtLeast(high, low - 1, nameof(high));
        if (high < low)
            return new Enclosure(0, 0);

        // From the side on which the interval is a tail less a smaller tail, so that little cancels.
        return low > trials * rate
            ? Less(UpperTail(trials, low, rate), UpperTail(trials, high + 1, rate))
            : Less(LowerTail(trials, high, rate), LowerTail(trials, low - 1, rate));
    }

    /// <summary>The probability of a number of successes outside two limits.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="low">Least number of successes inside.</param>
    /// <param name="high">Greatest number of successes inside, at least <paramref name="low"/> - 1.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>An enclosure of P(S &lt; low) + P(S &gt; high).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Outside(long trials, long low, long high, double rate)
    {
        Check.AtLeast(high, low - 1, nameof(high));
        var below = LowerTail(trials, low - 1, rate);
        var above = UpperTail(trials, high + 1, rate);
        return new Enclosure(Math.Min(1, below.Lower + above.Lower), Math.Min(1, below.Upper + above.Upper));
    }

    // The part may be so small that its own width is lost when the difference is rounded.
    static Enclosure Less(Enclosure whole, Enclosure part) => part.Upper == 0
        ? whole
        : new Enclosure(
            Math.Max(0, (whole.Lower - part.Upper) * (1 - Rounding)),
            Math.Min(1, Math.Max(0, (whole.Upper - part.Lower) * (1 + Rounding))));

    // Below the least normal number a relative error means nothing.
    static Enclosure Widened(double probability, bool known) => known
        ? new Enclosure(probability, probability)
        : new Enclosure(
            probability < 1e-300 ? 0 : probability * (1 - Rounding),
            Math.Min(1, Math.Max(1e-300, probability * (1 + Rounding))));

    sealed class OfRates : RateTheorem
    {
        public override string Name => BinomialTail.Name;

        public override string Assumes => "independent trials of one rate";

        public override long? TrialsNeeded(RatePlan plan, IReadOnlyList<RateSide> sides) => plan.Trials;
    }
}
