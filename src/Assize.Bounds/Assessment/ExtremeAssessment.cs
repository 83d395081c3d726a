namespace Assize.Bounds;

/// <summary>What an assertion on the greatest or the least of the draws does.</summary>
public sealed class ExtremeAssessment : Assessment
{
    readonly Law _law;
    readonly long _trials;
    readonly Band _band;

    /// <summary>An assertion on an extreme.</summary>
    /// <param name="law">The law of one draw on right code, of positive variance.</param>
    /// <param name="trials">Number of draws, in [1, 2^52].</param>
    /// <param name="greatest">True for the greatest draw, false for the least.</param>
    /// <param name="band">The extremes that pass.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public ExtremeAssessment(Law law, long trials, bool greatest, Band band)
    {
        if (band is null)
            throw new ArgumentNullException(nameof(band));

        // The least draw is the greatest one with every sign changed.
        _law = greatest ? law : law.Image(-1, 0);
        _band = greatest ? band : band.Mirrored();
        _trials = trials;
        TiltedSum.RequireVariance(Draws.Of(law, trials));
    }

    /// <inheritdoc/>
    public override string Theorem => "independent draws, one by one";

    /// <inheritdoc/>
    public override Enclosure FalseFailure
    {
        get
        {
            // Too great: one draw beyond; too small: no draw reaches the lower rim.
            var beyond = _band.High is { } high ? OneDraw.Above(_law, high, withPoint: !_band.HighPasses) : new Enclosure(0, 0);
            var reaches = _band.Low is { } low ? OneDraw.Above(_law, low, withPoint: _band.LowPasses) : new Enclosure(1, 1);
            var above = new Enclosure(OneOf(beyond.Lower), OneOf(beyond.Upper));
            var below = new Enclosure(None(reaches.Upper), None(reaches.Lower));
            return Sum(above, below);
        }
    }

    double OneOf(double probability) => probability >= 1 ? 1
        : Math.Min(1, -Elementary.ExpMinusOne(_trials * Elementary.LogOnePlus(-probability)));

    double None(double probability) => probability >= 1 ? 0 : Elementary.Exp(_trials * Elementary.LogOnePlus(-probability));
}
