namespace Assize.Bounds;

/// <summary>What an assertion does that at least so many of the equally likely values turn up.</summary>
public sealed class CoverageAssessment : Assessment
{
    // Up to so many steps the number of values seen is carried forward trial by trial, exactly.
    const double MostSteps = 200_000;

    readonly long _values;
    readonly long _trials;
    readonly long _least;
    readonly Lazy<Enclosure> _falseFailure;

    /// <summary>An assertion on the number of different values among the draws.</summary>
    /// <param name="values">Number of equally likely values, in [1, 1e9].</param>
    /// <param name="trials">Number of draws, in [1, 2^52].</param>
    /// <param name="leastDistinct">Least number of different values that passes; all of them for a coupon
    /// collector.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain.</exception>
    public CoverageAssessment(long values, long trials, long leastDistinct)
    {
        Check.AtLeast(values, 1, nameof(values));
        Check.AtMost(values, 1_000_000_000, nameof(values));
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        Check.AtLeast(leastDistinct, 0, nameof(leastDistinct));
        (_values, _trials, _least) = (values, trials, leastDistinct);
        _falseFailure = new(() => Red(trials));
    }

    /// <inheritdoc/>
    public override string Theorem => IsExact(_trials) ? "exact occupancy" : "occupancy, union and negative association";

    /// <inheritdoc/>
    public override Enclosure FalseFailure => _falseFailure.Value;

    /// <summary>The smallest share that one value may lose so that its absence is noticed: 1/values when it never
    /// comes.</summary>
    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence)
    {
        Check.Inside(confidence, 0, 1, nameof(confidence));
        if (_least < _values)
            return null;

        // Green needs the value to come at least once: 1 - (1 - rate)^n ≤ miss.
        double miss = Decimals.Complement(confidence);
        double rate = -Elementary.ExpMinusOne(Elementary.LogOnePlus(-miss) / _trials) * (1 - 1e-12);
        return rate >= 1.0 / _values ? 0 : -(1.0 / _values - rate);
    }

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        if (_least > _values)
            return null;

        // One more draw never takes a value away, so red falls with every draw; so does each of its bounds.
        return RateTheorem.First(_trials, trials => Bound(trials) <= risk);
    }

    bool IsExact(long trials) => (double)trials * Math.Min(_values, trials) <= MostSteps;

    Enclosure Red(long trials)
    {
        if (_least > Math.Min(_values, trials))
            return new Enclosure(1, 1);
        if (_least <= 1)
            return new Enclosure(0, 0);
        if (IsExact(trials))
            return Exact(trials);

        double missing = Missing(trials);
        // No value missing: the indicators of coming up are negatively associated, so all come with Π at most.
        double lower = _least == _values ? -Elementary.ExpMinusOne(_values * Elementary.LogOnePlus(-missing)) : 0;
        return new Enclosure(Math.Max(0, Math.Min(1, lower) * (1 - 1e-11)), Bound(trials));
    }

    // The number of values seen, one trial after another: every term positive, so nothing cancels.
    Enclosure Exact(long trials)
    {
        double[] seen = new double[Math.Min(_least, trials) + 1];
        seen[0] = 1;
        for (long trial = 1; trial <= trials; trial++)
        {
            for (long count = Math.Min(trial, seen.Length - 1); count >= 1; count--)
            {
                double stays = count == _least ? 0 : seen[count] * ((double)count / _values);
                seen[count] = (count == _least ? seen[count] : stays) + seen[count - 1] * (1 - (count - 1.0) / _values);
            }

            seen[0] = 0;
        }

        double red = 0;
        for (long count = 0; count < _least && count < seen.Length; count++)
            red += seen[count];
        double error = 1e-15 * (trials + 10);
        return new Enclosure(Math.Min(1, red) * (1 - error), Math.Min(1, red * (1 + error)));
    }

    // With r = values - least + 1: red is r values missing. Their indicators are negatively associated, so the
    // number missing is stochastically no wider than a binomial one in its exponential moments (Hoeffding's bound).
    double Bound(long trials)
    {
        double missing = Missing(trials);
        long many = _values - _least + 1;
        double share = (double)many / _values;
        double union = Math.Min(1, _values * missing / many);
        if (share <= missing)
            return union;

        return Math.Min(union, Enclosure.UpToExponential(_values * Divergence.Bernoulli(share, missing)).Upper);
    }

    // (1 - 1/values)^trials, rounded up.
    double Missing(long trials) => _values == 1 ? 0
        : Math.Min(1, Elementary.Exp(trials * Elementary.LogOnePlus(-1.0 / _values) * (1 - 1e-15)) * (1 + 1e-12));
}
