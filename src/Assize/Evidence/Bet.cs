using Assize.Bounds;

namespace Assize;

/// <summary>A weighted average of likelihood ratios between rates: the wealth of somebody who bets on each of them.</summary>
/// <remarks>
/// LR(q : p) = (q/p)^s ((1-q)/(1-p))^(n-s). With q above p it is a nonnegative supermartingale for every rate up to p, since its
/// one-step mean is linear in the rate, increasing, and 1 at p; with q below p likewise for every rate from p up. So is an average.
/// Wealth is taken from the counts, never accumulated.
/// </remarks>
sealed class Bet
{
    // 2^-53, the rounding of one operation.
    const double Unit = 1.1102230246251565e-16;

    readonly (double LogWeight, double OnSuccess, double OnFailure)[] _terms;

    Bet((double, double, double)[] terms) => _terms = terms;

    /// <summary>Bets on rates from the target away by the defect, twice, four times it …, and on the rim of the domain.</summary>
    public static Bet AgainstClaim(double target, double edge, double? defect, double rim)
    {
        var rates = new List<double>();
        if (defect is { } first)
        {
            double distance = first - target;
            for (double rate = first; Math.Abs(rate - target) < Math.Abs(rim - target) && rates.Count < 64; distance *= 2, rate = target + distance)
                rates.Add(rate);
        }

        rates.Add(rim);
        // Half of the money on the smallest defect, the rest shared: gross defects are caught at once for a few percent more there.
        return new Bet([.. rates.Select((rate, k) => Term(
            rates.Count == 1 ? 1 : k == 0 ? 0.5 : 0.5 / (rates.Count - 1), rate, edge))]);
    }

    /// <summary>Bets that the rate is right, half on the target and half on the edge nearest to the defect.</summary>
    public static Bet AgainstDefect(double target, double edge, double defect, double targetShare = 0.5) => target == edge
        ? new Bet([Term(1, target, defect)])
        : new Bet([Term(targetShare, target, defect), Term(1 - targetShare, edge, defect)]);

    /// <summary>The logarithm of the wealth.</summary>
    public double Log(long trials, long successes) => LogSum(trials, successes, out _);

    /// <summary>What the logarithm of the wealth surely is at least, whatever rounding did.</summary>
    public double LogAtLeast(long trials, long successes)
    {
        double log = LogSum(trials, successes, out double size);
        return log - Slack(size);
    }

    /// <summary>The same for the even average of two bets; either may be absent.</summary>
    public static double LogAtLeast(Bet? one, Bet? other, long trials, long successes)
    {
        if (one is null || other is null)
            return (one ?? other)!.LogAtLeast(trials, successes);

        double first = one.LogSum(trials, successes, out double firstSize);
        double second = other.LogSum(trials, successes, out double secondSize);
        return LogAverage(first, second) - Slack(Math.Max(firstSize, secondSize));
    }

    /// <summary>The logarithm of the even average of two bets; either may be absent.</summary>
    public static double Log(Bet? one, Bet? other, long trials, long successes) => one is null || other is null
        ? (one ?? other)!.Log(trials, successes)
        : LogAverage(one.Log(trials, successes), other.Log(trials, successes));

    /// <summary>The least number of successes with such a wealth, for a bet that gains by them; trials + 1 if there is none.</summary>
    public long LeastSuccesses(long trials, double log, long? guess = null) =>
        First(trials, guess ?? trials / 2, successes => Log(trials, successes) >= log);

    /// <summary>The greatest number of successes with such a wealth, for a bet that loses by them; -1 if there is none.</summary>
    public long GreatestSuccesses(long trials, double log, long? guess = null) =>
        First(trials, guess ?? trials / 2, successes => Log(trials, successes) < log) - 1;

    // The first count in [0, trials] where a condition that stays true once it is true holds, looked for outwards from a guess.
    static long First(long trials, long guess, Func<long, bool> holds)
    {
        long low = -1, high = trials + 1, stride = 1;
        for (long probe = Math.Clamp(guess, 0, trials); low + 1 < high; stride *= 4)
        {
            if (holds(probe))
                high = probe;
            else
                low = probe;
            probe = low < 0 && high > stride ? high - stride
                : high > trials && low + stride <= trials ? low + stride
                : low + (high - low) / 2;
        }

        return high;
    }

    static double Slack(double size) => double.IsInfinity(size) ? 0 : 8 * Unit * size + 1e-14;

    static double LogAverage(double first, double second)
    {
        double greater = Math.Max(first, second);
        return double.IsInfinity(greater)
            ? greater
            : greater + Elementary.LogOnePlus(Elementary.Exp(Math.Min(first, second) - greater)) - LogTwo;
    }

    const double LogTwo = 0.693147180559945309417;

    double LogSum(long trials, long successes, out double size)
    {
        double greatest = double.NegativeInfinity;
        size = 0;
        Span<double> logs = stackalloc double[_terms.Length];
        for (int k = 0; k < _terms.Length; k++)
        {
            var (weight, onSuccess, onFailure) = _terms[k];
            double won = Times(successes, onSuccess), lost = Times(trials - successes, onFailure);
            // Ruin wins over riches inside one term: infinity is never taken from infinity.
            logs[k] = double.IsNegativeInfinity(won) || double.IsNegativeInfinity(lost) ? double.NegativeInfinity : weight + won + lost;
            greatest = Math.Max(greatest, logs[k]);
            if (double.IsFinite(logs[k]))
                size = Math.Max(size, Math.Abs(won) + Math.Abs(lost));
        }

        if (double.IsInfinity(greatest))
            return greatest;

        double sum = 0;
        foreach (double log in logs)
            sum += Elementary.Exp(log - greatest);
        return greatest + Elementary.Log(sum);
    }

    static double Times(long count, double log) => count == 0 ? 0 : count * log;

    static (double, double, double) Term(double weight, double rate, double against) =>
        (Elementary.Log(weight), LogRatio(rate, against), LogRatio(1 - rate, 1 - against, against - rate));

    static double LogRatio(double rate, double against) => LogRatio(rate, against, rate - against);

    // ln(rate / against) from their difference, which is exact where the logarithm alone would cancel.
    static double LogRatio(double rate, double against, double difference)
    {
        if (rate == 0)
            return double.NegativeInfinity;
        if (against == 0)
            return double.PositiveInfinity;

        return Math.Abs(difference) < against / 2 ? Elementary.LogOnePlus(difference / against) : Elementary.Log(rate) - Elementary.Log(against);
    }
}
