namespace Assize.Bounds;

/// <summary>Exact confidence limits for a rate after a number of successes.</summary>
/// <remarks>
/// Rounded outwards: a limit is at least as far from the successes as the true one, by a relative 2e-12 at most of the
/// limit and of 1 minus the limit. Source: C. J. Clopper and E. S. Pearson, Biometrika 26 (1934) 404–413.
/// </remarks>
public static class BinomialLimits
{
    const double LeastRisk = 1e-250;

    // The tail is known to 5e-13 and is at least as steep as its argument to the power of ln 2.
    const double Outwards = 1e-12;

    /// <summary>The lower limit for the rate.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="successes">Number of successes, in [0, trials].</param>
    /// <param name="risk">The probability that the limit is above the rate, in [1e-250, ½].</param>
    /// <returns>The rate at which so many successes or more have probability risk, in [0, 1); 0 without a
    /// success.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Lower(long trials, long successes, double risk)
    {
        Require(trials, successes, risk);
        var (rate, other) = Solve(trials, successes, risk);
        return rate ?? Below(1 - other);
    }

    /// <summary>The upper limit for the rate; 1 minus it, without cancellation, is the lower limit for the
    /// failures.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="successes">Number of successes, in [0, trials].</param>
    /// <param name="risk">The probability that the limit is below the rate, in [1e-250, ½].</param>
    /// <returns>The rate at which so many successes or fewer have probability risk, in (0, 1]; 1 without a
    /// failure.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Upper(long trials, long successes, double risk)
    {
        Require(trials, successes, risk);
        var (rate, other) = Solve(trials, trials - successes, risk);
        return rate is { } below ? Math.Min(1, Above(1 - below)) : other;
    }

    static void Require(long trials, long successes, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        Check.AtLeast(successes, 0, nameof(successes));
        Check.AtMost(successes, trials, nameof(successes));
        Check.Between(risk, LeastRisk, 0.5, nameof(risk));
    }

    // The lower limit where that is below ½ or so, else 1 minus it; rounded so that the limit falls.
    static (double? Rate, double Other) Solve(long trials, long successes, double risk)
    {
        if (successes == 0)
            return (0, 1);

        double wanted = Elementary.Log(risk);
        if (Binomial.LogUpperTail(trials, successes, 0.5) < wanted)
            return (null, AboveHalf(trials, trials - successes, wanted));

        // P(S ≥ k) ≤ (n · rate)^k, so that the risk is not reached at the lower end.
        double least = wanted / successes - Elementary.Log(trials) - 1;
        double rate = Elementary.Exp(RootBracket.Find(
            x => Binomial.LogUpperTail(trials, successes, Elementary.Exp(x)) - wanted, least, AtHalf, 4e-16).Lower);
        return (rate * (1 - Outwards), 1);
    }

    // In failures and their rate, which is below ½: 1 - rate is never rounded.
    static double AboveHalf(long trials, long failures, double wanted)
    {
        // P(F ≤ m) ≥ (1 - rate)^n ≥ ½ at the lower end, at least the risk.
        double least = -Elementary.Log(trials) - 1;
        double other = Elementary.Exp(RootBracket.Find(
            x => Binomial.LogLowerTail(trials, failures, Elementary.Exp(x)) - wanted, least, AtHalf, 4e-16).Upper);
        return other * (1 + Outwards);
    }

    // A little above ln ½: a limit of exactly ½ lies inside the bracket.
    const double AtHalf = -0.69314;

    static double Below(double value) => value * (1 - 2.3e-16);

    static double Above(double value) => value * (1 + 2.3e-16);
}
