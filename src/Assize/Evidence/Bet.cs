using Assize.Bounds;

namespace Assize;

/// <summary>A weighted average of likelihood ratios between rates: the wealth of somebody who bets on each of
/// them.</summary>
/// <remarks>
/// LR(q : p) = (q/p)^s ((1-q)/(1-p))^(n-s). With q above p it is a nonnegative supermartingale for every rate up to p,
/// since its one-step mean is linear in the rate, increasing, and 1 at p; with q below p likewise for every rate from p
/// up. So is an average. Wealth is taken from the counts, never accumulated.
/// </remarks>
sealed class Bet
{
    // 2^-53, the rounding of one operation.
    const double Unit = 1.1102230246251565e-16;
    const double LogTwo = 0.693147180559945309417;

    readonly (double LogWeight, double OnSuccess, double OnFailure)[] _terms;
    readonly double _mostGain;

    Bet((double LogWeight, double OnSuccess, double OnFailure)[] terms)
    {
        _terms = terms;
        _mostGain = terms.Max(term => Math.Max(term.OnSuccess, term.OnFailure));
    }

    /// <summary>Bets on rates away from the target by the defect, twice, four times it …, and on the rim of the
    /// domain.</summary>
    public static Bet AgainstClaim(double target, double edge, double? defect, double rim)
    {
        var rates = new List<double>();
        double distance = (defect ?? rim) - target;
        for (double rate = target + distance; Math.Abs(rate - target) < Math.Abs(rim - target); rate = target + distance)
        {
            rates.Add(rates.Count == 0 ? defect!.Value : rate);
            distance *= 2;
        }

        rates.Add(rim);
        // Half of the money on the smallest defect, the rest shared: gross defects are caught at once, for little there.
        return new Bet([.. rates.Select((rate, k) => Term(
            rates.Count == 1 ? 1 : k == 0 ? 0.5 : 0.5 / (rates.Count - 1), rate, edge))]);
    }

    /// <summary>Bets that the rate is right: a share on the target, the rest on the edge nearest to the
    /// defect.</summary>
    public static Bet AgainstDefect(double target, double edge, double defect, double targetShare) => target == edge
        ? new Bet([Term(1, target, defect)])
        : new Bet([Term(targetShare, target, defect), Term(1 - targetShare, edge, defect)]);

    /// <summary>The even average of two bets, either of which may be absent.</summary>
    public static LogWealth Average(Bet? one, Bet? other, long trials, long successes)
    {
        if (one is null || other is null)
            return (one ?? other)!.Wealth(trials, successes);

        var (first, second) = (one.Wealth(trials, successes), other.Wealth(trials, successes));
        double greater = Math.Max(first.Value, second.Value);
        double lesser = Math.Min(first.Value, second.Value);
        double log = double.IsInfinity(greater)
            ? greater
            : greater + Elementary.LogOnePlus(Elementary.Exp(lesser - greater)) - LogTwo;
        return new LogWealth(log, Math.Max(first.Error, second.Error));
    }

    /// <summary>The wealth after so many trials and successes.</summary>
    public LogWealth Wealth(long trials, long successes)
    {
        Span<double> logs = stackalloc double[_terms.Length];
        double greatest = double.NegativeInfinity;
        double size = 0;
        for (int k = 0; k < _terms.Length; k++)
        {
            var (weight, onSuccess, onFailure) = _terms[k];
            double won = Times(successes, onSuccess), lost = Times(trials - successes, onFailure);
            // Ruin wins over riches inside one term: infinity is never taken from infinity.
            logs[k] = double.IsNegativeInfinity(won) || double.IsNegativeInfinity(lost)
                ? double.NegativeInfinity
                : weight + won + lost;
            greatest = Math.Max(greatest, logs[k]);
            if (double.IsFinite(logs[k]))
                size = Math.Max(size, Math.Abs(won) + Math.Abs(lost));
        }

        // Each coefficient is within 5 units, product and sum add 2; the logarithm of the sum is within 1e-14.
        double error = 8 * Unit * size + 1e-14;
        return new LogWealth(double.IsInfinity(greatest) ? greatest : greatest + LogSum(logs, greatest), error);
    }

    /// <summary>The fewest further draws that may bring a wealth to a level, at least 1: those the bet gains by, the others
    /// only lower it. Before that no exact test is needed.</summary>
    public long StepsTo(double log, LogWealth from)
    {
        const double most = long.MaxValue / 4;
        double steps = (log - from.AtMost) / _mostGain * (1 - 1e-12);
        return double.IsNegativeInfinity(from.Value) || steps > most ? (long)most : (long)Math.Max(1, steps);
    }

    /// <summary>The least number of successes that may have such a wealth, for a bet that gains by them; trials + 1 if
    /// none. Quick when the guess is near.</summary>
    public long LeastSuccesses(long trials, double log, long guess) =>
        First(trials, guess, successes => Wealth(trials, successes).AtMost >= log);

    /// <summary>The greatest number of successes that may have such a wealth, for a bet that loses by them; -1 if
    /// none.</summary>
    public long GreatestSuccesses(long trials, double log, long guess) =>
        First(trials, guess + 1, successes => Wealth(trials, successes).AtMost < log) - 1;

    // The first number in [0, trials] where the condition holds, or trials + 1: strides that double, then halves.
    static long First(long trials, long guess, Func<long, bool> holds)
    {
        long low = -1, high = trials + 1;
        long probe = Math.Clamp(guess, 0, trials);
        for (long stride = 1; low + 1 < high; stride *= 2)
        {
            if (holds(probe))
                high = probe;
            else
                low = probe;

            bool isBracketed = low >= 0 && high <= trials;
            probe = isBracketed ? low + (high - low) / 2
                : high <= trials ? Math.Max(0, high - stride)
                : Math.Min(trials, low + stride);
        }

        return high;
    }

    static double LogSum(ReadOnlySpan<double> logs, double greatest)
    {
        if (logs.Length == 1)
            return 0;

        double sum = 0;
        foreach (double log in logs)
            sum += Elementary.Exp(log - greatest);
        return Elementary.Log(sum);
    }

    static double Times(long count, double log) => count == 0 ? 0 : count * log;

    static (double, double, double) Term(double weight, double rate, double against) => (
        Elementary.Log(weight),
        LogRatio(rate, against, rate - against),
        LogRatio(1 - rate, 1 - against, against - rate));

    // ln(rate / against), from their difference where they are near: there the logarithm of the quotient would cancel.
    static double LogRatio(double rate, double against, double difference)
    {
        if (rate == 0)
            return double.NegativeInfinity;
        if (against == 0)
            return double.PositiveInfinity;

        return Math.Abs(difference) < against / 2
            ? Elementary.LogOnePlus(difference / against)
            : Elementary.Log(rate / against);
    }
}
