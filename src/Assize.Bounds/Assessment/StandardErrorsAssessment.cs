namespace Assize.Bounds;

/// <summary>What an assertion does that an average stays within some standard errors of its mean.</summary>
public sealed class StandardErrorsAssessment : Assessment
{
    readonly MeanAssessment? _known;
    readonly long _trials;
    readonly double _errors;

    /// <summary>An assertion |average - mean| &lt; errors · sd / √trials.</summary>
    /// <param name="law">The law of one draw on right code, of positive variance; normal when the standard deviation is
    /// estimated.</param>
    /// <param name="trials">Number of draws, in [2, 1e15].</param>
    /// <param name="errors">The number of standard errors, above 0.</param>
    /// <param name="estimated">Whether the standard deviation is that of the draws, divided by trials - 1, instead of the
    /// law's.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN; or the deviation is estimated
    /// from draws that are not normal.</exception>
    public StandardErrorsAssessment(Law law, long trials, double errors, bool estimated)
    {
        if (law is null)
            throw new ArgumentNullException(nameof(law));
        Check.AtLeast(trials, 2, nameof(trials));
        Check.Between(errors, 1e-100, 1e100, nameof(errors));
        (_trials, _errors) = (trials, errors);
        if (estimated && law is not Normal && law is not Affine { Parts.Law: Normal })
            throw new ArgumentException("With an estimated deviation only normal draws have a known distribution.", nameof(law));
        if (!estimated)
        {
            double half = errors * Math.Sqrt(law.Variance / trials);
            _known = new MeanAssessment(law, trials, new Band(law.Mean - half, law.Mean + half));
        }
    }

    /// <inheritdoc/>
    public override string Theorem => _known?.Theorem ?? "exact Student";

    /// <inheritdoc/>
    public override Enclosure FalseFailure
    {
        get
        {
            if (_known is not null)
                return _known.FalseFailure;

            double red = Math.Min(1, 2 * Student.UpperTail(_trials - 1, _errors));
            return new Enclosure(red * (1 - 1e-11), Math.Min(1, red * (1 + 1e-11)));
        }
    }

    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence) =>
        _known?.SmallestDefectCaught(confidence) ?? base.SmallestDefectCaught(confidence);

    /// <summary>More trials narrow the band as they narrow the average: they do not help.</summary>
    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk) => base.TrialsNeeded(risk);

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk) =>
        _known?.ToleranceAffordable(risk) ?? base.ToleranceAffordable(risk);
}
