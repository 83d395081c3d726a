namespace Assize.Bounds;

/// <summary>What an existing assertion on a count of successes does: how often it is red on right code and what it
/// catches.</summary>
public sealed class ProportionAssessment : Assessment
{
    readonly long _trials;
    readonly long _acceptLow;
    readonly long _acceptHigh;
    readonly ProportionBand _shares;
    readonly double _rate;
    readonly Lazy<Enclosure> _falseFailure;

    /// <summary>An assertion on a count of successes.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="acceptLow">Least number of successes that passes.</param>
    /// <param name="acceptHigh">Greatest number of successes that passes.</param>
    /// <param name="shares">The same band as shares, for other numbers of trials.</param>
    /// <param name="rate">The right rate, in [0, 1].</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public ProportionAssessment(long trials, long acceptLow, long acceptHigh, ProportionBand shares, double rate)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Probability(rate, nameof(rate));
        (_trials, _acceptLow, _acceptHigh, _rate) = (trials, acceptLow, acceptHigh, rate);
        _shares = shares ?? throw new ArgumentNullException(nameof(shares));
        _falseFailure = new(() => Assess(trials, acceptLow, acceptHigh, rate));
    }

    /// <inheritdoc/>
    public override string Theorem => BinomialTail.Name;

    /// <inheritdoc/>
    public override Enclosure FalseFailure => _falseFailure.Value;

    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence) =>
        SmallestDefectCaught(_trials, _acceptLow, _acceptHigh, _rate, confidence);

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk) => TrialsNeeded(_shares, _rate, risk);

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk) =>
        _trials <= RatePlan.MaximumTrials ? ToleranceAffordable(_trials, _rate, risk) : null;

    /// <summary>How often the assertion is red.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="acceptLow">Least number of successes that passes.</param>
    /// <param name="acceptHigh">Greatest number of successes that passes, at least <paramref name="acceptLow"/> -
    /// 1.</param>
    /// <param name="rate">The true rate, in [0, 1].</param>
    /// <returns>An enclosure of the probability of red: the false failure if the rate is right.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Assess(long trials, long acceptLow, long acceptHigh, double rate)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        return BinomialTail.Outside(trials, acceptLow, acceptHigh, rate);
    }

    /// <summary>The smallest error of the rate that the assertion catches.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="acceptLow">Least number of successes that passes.</param>
    /// <param name="acceptHigh">Greatest number of successes that passes.</param>
    /// <param name="rate">The right rate, in [0, 1].</param>
    /// <param name="confidence">How surely an error must turn the assertion red, in (0, 1).</param>
    /// <returns>
    /// The signed distance from the rate, in the nearer direction, from which on the assertion is red with that
    /// probability,
    /// rounded away from 0; 0 when it is red so often on the right rate; null when it catches no rate at all.
    /// </returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double? SmallestDefectCaught(
        long trials, long acceptLow, long acceptHigh, double rate, double confidence)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Probability(rate, nameof(rate));
        Check.Inside(confidence, 0, 1, nameof(confidence));
        double miss = Decimals.Complement(confidence);
        double Green(double truth) =>
            acceptHigh < acceptLow ? 0 : BinomialTail.Between(trials, acceptLow, acceptHigh, truth).Upper;

        if (Green(rate) <= miss)
            return 0;

        double? above = Nearest(Green, rate, 1, miss);
        double? below = Nearest(Green, rate, 0, miss);
        return above is null || below > -above ? below ?? above : above;
    }

    /// <summary>How many trials the same band of shares needs.</summary>
    /// <param name="band">The shares that pass.</param>
    /// <param name="rate">The right rate, in [0, 1].</param>
    /// <param name="risk">The false failure allowed, in [1e-300, 1].</param>
    /// <returns>
    /// A number from which on every number of trials is red with no more than that probability; at most one step of
    /// the count
    /// above the least such number. Null when the rate is not inside the band, or more than 1e15 trials would be
    /// needed.
    /// </returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(ProportionBand band, double rate, double risk)
    {
        if (band is null)
            throw new ArgumentNullException(nameof(band));
        Check.Probability(rate, nameof(rate));
        Check.Between(risk, 1e-300, 1, nameof(risk));
        return new BandSearch(band, rate, risk).Trials();
    }

    /// <summary>The narrowest band around the rate that the trials afford.</summary>
    /// <param name="trials">Number of trials, in [1, 1e15].</param>
    /// <param name="rate">The right rate, in [0, 1].</param>
    /// <param name="risk">The false failure allowed, in [1e-300, 1).</param>
    /// <returns>The distance from the rate to the rims; no share lies on a rim, so it does not matter whether rims
    /// pass.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double ToleranceAffordable(long trials, double rate, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, RatePlan.MaximumTrials, nameof(trials));
        Check.Probability(rate, nameof(rate));
        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        long high = new RateSide(upper: true, rate, null, risk / 2).Limit(trials);
        long low = trials - new RateSide(upper: false, rate, null, risk / 2).Limit(trials);
        return Math.Max((high + 0.5) / trials - rate, rate - (low - 0.5) / trials);
    }

    // Green is unimodal in the truth, so away from the right rate it sinks to the miss once and stays below.
    static double? Nearest(Func<double, double> green, double rate, double end, double miss)
    {
        if (rate == end || green(end) > miss)
            return null;

        var (lower, upper) = RootBracket.Find(
            truth => green(truth) - miss, Math.Min(rate, end), Math.Max(rate, end), 1e-13);
        return (end > rate ? upper - rate : lower - rate) * (1 + 1e-12);
    }
}
