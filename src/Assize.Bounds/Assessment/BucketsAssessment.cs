namespace Assize.Bounds;

/// <summary>What an assertion on the count in every bucket does, when all counts must lie in one band.</summary>
/// <remarks>
/// Red is the union of the buckets' own reds, so at most their sum. Counts of buckets are negatively associated (K.
/// Joag-Dev and F. Proschan, Ann. Statist. 11 (1983) 286, from memory): that no bucket has too many has at most the
/// product of the single probabilities, and likewise that none has too few; so red is at least 1 minus either product.
/// </remarks>
public sealed class BucketsAssessment : Assessment
{
    readonly IReadOnlyList<(double Share, long Buckets)> _kinds;
    readonly long _trials;
    readonly long _low;
    readonly long _high;
    readonly Lazy<Enclosure> _falseFailure;

    /// <summary>An assertion on buckets of given shares.</summary>
    /// <param name="shares">The share of each bucket on right code, each in [0, 1].</param>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="acceptLow">Least count that passes in any bucket.</param>
    /// <param name="acceptHigh">Greatest count that passes in any bucket.</param>
    /// <exception cref="ArgumentException">There is no bucket, or an argument lies outside its domain.</exception>
    public BucketsAssessment(IReadOnlyList<double> shares, long trials, long acceptLow, long acceptHigh)
        : this(
            [.. (shares ?? throw new ArgumentNullException(nameof(shares))).GroupBy(share => share).Select(kind => (kind.Key, (long)kind.Count()))],
            trials, acceptLow, acceptHigh)
    {
    }

    /// <summary>An assertion on buckets of equal shares.</summary>
    /// <param name="buckets">Number of buckets, at least 1.</param>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="acceptLow">Least count that passes in any bucket.</param>
    /// <param name="acceptHigh">Greatest count that passes in any bucket.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain.</exception>
    public BucketsAssessment(long buckets, long trials, long acceptLow, long acceptHigh)
        : this([(1.0 / Counted(buckets), buckets)], trials, acceptLow, acceptHigh)
    {
    }

    BucketsAssessment((double Share, long Buckets)[] kinds, long trials, long acceptLow, long acceptHigh)
    {
        if (kinds.Length == 0)
            throw new ArgumentException("There must be at least one bucket.", nameof(kinds));
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        foreach (var (share, _) in kinds)
            Check.Probability(share, "shares");
        (_kinds, _trials, _low, _high) = (kinds, trials, acceptLow, acceptHigh);
        _falseFailure = new(() => Red(_trials, _low, _high));
    }

    /// <inheritdoc/>
    public override string Theorem => $"{BinomialTail.Name}, union over buckets";

    /// <inheritdoc/>
    public override Enclosure FalseFailure => _falseFailure.Value;

    /// <summary>The smallest error of one bucket's share that its own count shows: the bucket's share moves, the others give
    /// way.</summary>
    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence)
    {
        double? worst = 0;
        foreach (var (share, _) in _kinds)
        {
            if (ProportionAssessment.SmallestDefectCaught(_trials, _low, _high, share, confidence) is not { } caught)
                return null;
            worst = Math.Abs(caught) > Math.Abs(worst.Value) ? caught : worst;
        }

        return worst;
    }

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        var band = new ProportionBand((_low - 0.5) / _trials, (_high + 0.5) / _trials);
        long buckets = _kinds.Sum(kind => kind.Buckets);
        long? most = 1;
        foreach (var (share, _) in _kinds)
        {
            long? needed = ProportionAssessment.TrialsNeeded(band, share, Math.Max(1e-300, risk / buckets));
            most = needed is null || most is null ? null : Math.Max(most.Value, needed.Value);
        }

        return most;
    }

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk)
    {
        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        if (_trials > RatePlan.MaximumTrials)
            return null;

        long buckets = _kinds.Sum(kind => kind.Buckets);
        return _kinds.Max(kind => ProportionAssessment.ToleranceAffordable(_trials, kind.Share, Math.Max(1e-300, risk / buckets)));
    }

    Enclosure Red(long trials, long low, long high)
    {
        if (high < low)
            return new Enclosure(1, 1);

        double union = 0, single = 0, notAbove = 0, notBelow = 0;
        foreach (var (share, buckets) in _kinds)
        {
            var red = BinomialTail.Outside(trials, low, high, share);
            union += buckets * red.Upper;
            single = Math.Max(single, red.Lower);
            notAbove += buckets * LogGreen(high >= trials ? 0 : BinomialTail.Outside(trials, 0, high, share).Lower);
            notBelow += buckets * LogGreen(low <= 0 ? 0 : BinomialTail.Outside(trials, low, trials, share).Lower);
        }

        double lower = Math.Max(single, -Elementary.ExpMinusOne(Math.Min(notAbove, notBelow)) * (1 - 1e-14));
        return new Enclosure(Math.Min(1, lower), Math.Min(1, union * (1 + 1e-14)));
    }

    static double LogGreen(double red) => red >= 1 ? double.NegativeInfinity : Elementary.LogOnePlus(-red);

    static long Counted(long buckets)
    {
        Check.AtLeast(buckets, 1, nameof(buckets));
        return buckets;
    }
}
