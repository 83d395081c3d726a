namespace Assize.Bounds;

/// <summary>How often independent yes/no trials, each with a rate of its own, give so many successes.</summary>
/// <remarks>
/// <para>Holds for: independent trials that succeed with known rates, which may differ.</para>
/// <para>Guarantee: the true probability lies inside the enclosure, at every number of trials.</para>
/// <para>Accuracy: up to 20,000 trials the ends differ from the truth by at most 2e-11 of it while it is above 1e-300;
/// beyond as <see cref="LatticeSum"/> where there are few rates, else as <see cref="TiltedSum"/>.</para>
/// <para>Source: S. D. Poisson, Recherches sur la probabilité des jugements (1837), for the law (from memory); the
/// recursion adds one trial after the other. The page gives its error.</para>
/// </remarks>
public static class PoissonBinomial
{
    /// <summary>Up to so many trials every one is added exactly.</summary>
    public const int ExactTrials = 20_000;

    // So many different rates are inverted together before the cost of one inversion shows.
    const int FewRates = 100;

    const double UnitRoundoff = 1.2e-16;

    /// <summary>The probability of so many successes or more.</summary>
    /// <param name="rates">The probability of a success in each trial, in [0, 1]; at least one.</param>
    /// <param name="successes">Least number of successes; any whole number.</param>
    /// <returns>An enclosure of P(S ≥ successes).</returns>
    /// <exception cref="ArgumentException">There is no trial, or a rate lies outside [0, 1] or is NaN.</exception>
    public static Enclosure UpperTail(IReadOnlyList<double> rates, long successes)
    {
        Require(rates);
        if (successes <= 0)
            return new Enclosure(1, 1);
        if (successes > rates.Count)
            return new Enclosure(0, 0);

        return rates.Count <= ExactTrials
            ? Passing([.. rates], [.. rates.Select(rate => 1 - rate)], (int)successes)
            : Beyond(rates, successes, upper: true);
    }

    /// <summary>The probability of so many successes or fewer.</summary>
    /// <param name="rates">The probability of a success in each trial, in [0, 1]; at least one.</param>
    /// <param name="successes">Greatest number of successes; any whole number.</param>
    /// <returns>An enclosure of P(S ≤ successes).</returns>
    /// <exception cref="ArgumentException">There is no trial, or a rate lies outside [0, 1] or is NaN.</exception>
    public static Enclosure LowerTail(IReadOnlyList<double> rates, long successes)
    {
        Require(rates);
        if (successes < 0)
            return new Enclosure(0, 0);
        if (successes >= rates.Count)
            return new Enclosure(1, 1);

        return rates.Count <= ExactTrials
            ? Passing([.. rates.Select(rate => 1 - rate)], [.. rates], rates.Count - (int)successes)
            : Beyond(rates, successes, upper: false);
    }

    static void Require(IReadOnlyList<double> rates)
    {
        if (rates is null || rates.Count == 0)
            throw new ArgumentException("There must be at least one trial.", nameof(rates));
        foreach (double rate in rates)
            Check.Probability(rate, nameof(rates));
    }

    // The probability that the count ever reaches a level: all terms are positive, so each trial costs three roundings.
    static Enclosure Passing(double[] hits, double[] misses, int level)
    {
        var alive = new double[level];
        alive[0] = 1;
        double passed = 0;
        for (int trial = 0; trial < hits.Length; trial++)
        {
            double hit = hits[trial], miss = misses[trial];
            passed += alive[level - 1] * hit;
            for (int count = Math.Min(level - 1, trial + 1); count > 0; count--)
                alive[count] = alive[count] * miss + alive[count - 1] * hit;
            alive[0] *= miss;
        }

        passed = Math.Min(1, passed);
        return Enclosure.Widened(passed, passed, (4 * hits.Length + 10) * UnitRoundoff);
    }

    static Enclosure Beyond(IReadOnlyList<double> rates, long successes, bool upper)
    {
        var groups = rates.GroupBy(rate => rate)
            .Select(group => (Law.Bernoulli(group.Key), group.LongCount())).ToArray();
        var draws = Draws.Of(groups);
        if (!(draws.Variance > 0))
            return (upper ? draws.Mean >= successes : draws.Mean <= successes)
                ? new Enclosure(1, 1)
                : new Enclosure(0, 0);

        bool few = groups.Length <= FewRates && draws.Variance < 1e10;
        return upper
            ? few ? LatticeSum.UpperTail(draws, successes) : TiltedSum.UpperTail(draws, successes)
            : few ? LatticeSum.LowerTail(draws, successes) : TiltedSum.LowerTail(draws, successes);
    }
}
