namespace Assize.Bounds;

/// <summary>Probabilities of the number of successes in independent trials of one rate.</summary>
/// <remarks>
/// Relative error below 5e-13 while the result is above 1e-300, for every number of trials up to 1e9. The rate is
/// taken as the
/// exact double it is, and 1 - rate is never rounded where that would show.
/// </remarks>
public static class Binomial
{
    /// <summary>The greatest number of trials these functions take: 2^52.</summary>
    public const long MaximumTrials = 1L << 52;

    /// <summary>The probability of exactly so many successes.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Number of successes; outside [0, trials] the probability is 0.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>P(S = successes), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Mass(long trials, long successes, double rate)
    {
        Require(trials, rate);
        return Point(trials, successes, rate) is { } point ? point.Mass : Always(successes, trials, rate) ? 1 : 0;
    }

    /// <summary>The logarithm of the probability of exactly so many successes.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Number of successes; outside [0, trials] the probability is 0.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>ln P(S = successes), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogMass(long trials, long successes, double rate)
    {
        Require(trials, rate);
        return Point(trials, successes, rate) is { } point
            ? point.LogMass
            : Always(successes, trials, rate) ? 0 : double.NegativeInfinity;
    }

    /// <summary>The probability of so many successes or more.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Least number of successes; any whole number below 2^53.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>P(S ≥ successes), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double UpperTail(long trials, long successes, double rate)
    {
        Require(trials, rate);
        if (Sure(trials, successes, rate))
            return 1;
        if (Impossible(trials, successes, rate))
            return 0;

        return ReachesMode(trials, successes, rate)
            ? new BinomialPoint(trials, successes, rate).UpperTail
            : 1 - new BinomialPoint(trials, successes - 1, rate).LowerTail;
    }

    /// <summary>The probability of so many successes or fewer.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Greatest number of successes; any whole number below 2^53.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>P(S ≤ successes), in [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LowerTail(long trials, long successes, double rate)
    {
        Require(trials, rate);
        long next = successes + 1;
        if (Sure(trials, next, rate))
            return 0;
        if (Impossible(trials, next, rate))
            return 1;

        return ReachesMode(trials, next, rate)
            ? 1 - new BinomialPoint(trials, next, rate).UpperTail
            : new BinomialPoint(trials, successes, rate).LowerTail;
    }

    /// <summary>The logarithm of the probability of so many successes or more; it does not underflow.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Least number of successes; any whole number below 2^53.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>ln P(S ≥ successes), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogUpperTail(long trials, long successes, double rate)
    {
        Require(trials, rate);
        if (Sure(trials, successes, rate))
            return 0;
        if (Impossible(trials, successes, rate))
            return double.NegativeInfinity;

        return ReachesMode(trials, successes, rate)
            ? new BinomialPoint(trials, successes, rate).LogUpperTail
            : Elementary.LogOnePlus(-new BinomialPoint(trials, successes - 1, rate).LowerTail);
    }

    /// <summary>The logarithm of the probability of so many successes or fewer; it does not underflow.</summary>
    /// <param name="trials">Number of trials, in [0, 2^52].</param>
    /// <param name="successes">Greatest number of successes; any whole number below 2^53.</param>
    /// <param name="rate">Probability of a success in one trial, in [0, 1].</param>
    /// <returns>ln P(S ≤ successes), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double LogLowerTail(long trials, long successes, double rate)
    {
        Require(trials, rate);
        long next = successes + 1;
        if (Sure(trials, next, rate))
            return double.NegativeInfinity;
        if (Impossible(trials, next, rate))
            return 0;

        return ReachesMode(trials, next, rate)
            ? Elementary.LogOnePlus(-new BinomialPoint(trials, next, rate).UpperTail)
            : new BinomialPoint(trials, successes, rate).LogLowerTail;
    }

    static void Require(long trials, double rate)
    {
        Check.AtLeast(trials, 0, nameof(trials));
        Check.AtMost(trials, MaximumTrials, nameof(trials));
        Check.Probability(rate, nameof(rate));
    }

    static BinomialPoint? Point(long trials, long successes, double rate) =>
        successes >= 0 && successes <= trials && rate > 0 && rate < 1 && trials > 0
            ? new BinomialPoint(trials, successes, rate)
            : null;

    static bool Always(long successes, long trials, double rate) =>
        trials == 0 ? successes == 0 : rate == 0 ? successes == 0 : rate == 1 && successes == trials;

    static bool Sure(long trials, long successes, double rate) =>
        successes <= 0 || (rate == 1 && successes <= trials);

    static bool Impossible(long trials, long successes, double rate) => successes > trials || rate == 0;

    // From here on the fraction for the upper tail converges; one below, that for the lower tail does.
    static bool ReachesMode(long trials, long successes, double rate) => successes >= (trials + 1) * rate;
}
