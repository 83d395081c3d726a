namespace Assize.Bounds;

/// <summary>What an assertion on the variance or the standard deviation of the draws does.</summary>
/// <remarks>
/// Normal draws: exact. Draws in a range: the sample variance is the average of half squared differences over all
/// pairs, and
/// exponential moments of such an average are those of n/2 independent pairs at most (W. Hoeffding 1963, section 5), so
/// only the upper end is proven.
/// </remarks>
public sealed class VarianceAssessment : Assessment
{
    readonly Law _law;
    readonly long _trials;
    readonly Band _band;
    readonly double _ratio;

    /// <summary>An assertion on a spread.</summary>
    /// <param name="law">The law of one draw on right code, of positive variance; normal, or of bounded range.</param>
    /// <param name="trials">Number of draws, in [2, 1e9].</param>
    /// <param name="band">The values that pass, 0 or more.</param>
    /// <param name="dividedByTrialsLessOne">Whether the sum of squares is divided by trials - 1, not by trials.</param>
    /// <param name="root">Whether the root is taken: a standard deviation.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public VarianceAssessment(Law law, long trials, Band band, bool dividedByTrialsLessOne, bool root)
    {
        Check.AtLeast(trials, 2, nameof(trials));
        Check.AtMost(trials, 1_000_000_000, nameof(trials));
        TiltedSum.RequireVariance(Draws.Of(law, trials));
        if (band is null)
            throw new ArgumentNullException(nameof(band));

        double? Variance(double? rim) => rim is not { } value ? null : value <= 0 ? 0 : root ? value * value : value;
        (_law, _trials) = (law, trials);
        _ratio = dividedByTrialsLessOne ? 1 : (trials - 1.0) / trials;
        // From here on the band of the variance that is divided by trials - 1.
        _band = (band with { Low = Variance(band.Low), High = Variance(band.High) }).Times(1 / _ratio);
    }

    bool IsNormal => _law is Normal || (_law is Affine { Parts.Law: Normal });

    /// <inheritdoc/>
    public override string Theorem => IsNormal ? "exact chi-square" : "Hoeffding, pairs of draws";

    /// <inheritdoc/>
    public override Enclosure FalseFailure => IsNormal ? Normally() : new Enclosure(0, Math.Min(1, Bounded()));

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        return null;
    }

    Enclosure Normally()
    {
        double degrees = _trials - 1;
        double Point(double rim) => degrees * rim / _law.Variance;
        double above = _band.High is { } high ? ChiSquare.UpperTail(degrees, Point(high)) : 0;
        double below = _band.Low is > 0 and { } low ? ChiSquare.LowerTail(degrees, Point(low)) : 0;
        double red = above + below;
        return new Enclosure(Math.Min(1, red) * (1 - 1e-10), Math.Min(1, red * (1 + 1e-10)));
    }

    double Bounded()
    {
        double range = _law.Maximum - _law.Minimum;
        if (!(range <= double.MaxValue))
            return 1;

        double most = range * range / 2;
        double mean = Math.Min(1, _law.Variance / most);
        long pairs = _trials / 2;
        double above = _band.High is not { } high ? 0
            : high / most >= 1 ? 0
            : high / most <= mean ? 1
            : Hoeffding.UpperTail(pairs, high / most * (1 - 1e-12), mean).Upper;
        double below = _band.Low is not > 0 ? 0
            : _band.Low / most >= mean ? 1
            : Hoeffding.LowerTail(pairs, Math.Min(mean, _band.Low.Value / most * (1 + 1e-12)), mean).Upper;
        return above + below;
    }
}
