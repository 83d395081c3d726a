namespace Assize.Bounds;

/// <summary>What an assertion on a draw of given rank does: the median, a percentile of the sample.</summary>
public sealed class QuantileAssessment : Assessment
{
    readonly Law _law;
    readonly long _trials;
    readonly long _rank;
    readonly Band _band;

    /// <summary>An assertion on an order statistic.</summary>
    /// <param name="law">The law of one draw on right code, of positive variance.</param>
    /// <param name="trials">Number of draws, in [1, 2^52].</param>
    /// <param name="rank">Which draw in ascending order, in [1, <paramref name="trials"/>].</param>
    /// <param name="band">The values that pass.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public QuantileAssessment(Law law, long trials, long rank, Band band)
    {
        Check.AtLeast(rank, 1, nameof(rank));
        Check.AtMost(rank, trials, nameof(rank));
        TiltedSum.RequireVariance(Draws.Of(law, trials));
        (_law, _trials, _rank) = (law, trials, rank);
        _band = band ?? throw new ArgumentNullException(nameof(band));
    }

    /// <inheritdoc/>
    public override string Theorem => $"{BinomialTail.Name} of the draws beyond a rim";

    /// <inheritdoc/>
    public override Enclosure FalseFailure
    {
        get
        {
            var none = new Enclosure(0, 0);
            // The draw of this rank is beyond the upper rim when fewer than rank draws are not.
            var above = _band.High is { } high ? TooFew(OneDraw.Below(_law, high, withPoint: _band.HighPasses), _rank) : none;
            var below = _band.Low is { } low ? TooFew(OneDraw.Above(_law, low, withPoint: _band.LowPasses), _trials - _rank + 1) : none;
            return Sum(above, below);
        }
    }

    // P(count < needed), falling as the share rises.
    Enclosure TooFew(Enclosure share, long needed) => new(
        BinomialTail.Outside(_trials, needed, _trials, share.Upper).Lower,
        BinomialTail.Outside(_trials, needed, _trials, share.Lower).Upper);
}
