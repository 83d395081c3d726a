namespace Assize.Bounds;

/// <summary>What an assertion on the difference of two averages does.</summary>
public sealed class DifferenceAssessment : Assessment
{
    readonly Draws _draws;
    readonly Band _band;

    /// <summary>An assertion on the first average minus the second.</summary>
    /// <param name="first">The law of one draw of the first average on right code, of positive variance.</param>
    /// <param name="firstTrials">Number of its draws, in [1, 1e15].</param>
    /// <param name="second">The law of one draw of the second average, of positive variance.</param>
    /// <param name="secondTrials">Number of its draws, in [1, 1e15].</param>
    /// <param name="band">The differences that pass.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public DifferenceAssessment(Law first, long firstTrials, Law second, long secondTrials, Band band)
    {
        if (first is null)
            throw new ArgumentNullException(nameof(first));
        if (second is null)
            throw new ArgumentNullException(nameof(second));

        Check.AtLeast(firstTrials, 1, nameof(firstTrials));
        Check.AtLeast(secondTrials, 1, nameof(secondTrials));
        _draws = Draws.Of((first.Image(1.0 / firstTrials, 0), firstTrials), (second.Image(-1.0 / secondTrials, 0), secondTrials));
        TiltedSum.RequireVariance(_draws);
        _band = band ?? throw new ArgumentNullException(nameof(band));
    }

    /// <inheritdoc/>
    public override string Theorem => SumTail.TheoremFor(_draws);

    /// <inheritdoc/>
    public override Enclosure FalseFailure
    {
        get
        {
            var none = new Enclosure(0, 0);
            var above = _band.High is { } high ? SumTail.Above(_draws, high, withRim: !_band.HighPasses) : none;
            var below = _band.Low is { } low ? SumTail.Below(_draws, low, withRim: !_band.LowPasses) : none;
            return Sum(above, below);
        }
    }

    /// <summary>The smallest shift between the two that the assertion catches.</summary>
    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence)
    {
        Check.Inside(confidence, 0, 1, nameof(confidence));
        double miss = Decimals.Complement(confidence);
        double reach = 60 * Math.Sqrt(_draws.Variance);
        double? up = _band.High is not { } high ? null
            : Least(Math.Abs(high - _draws.Mean) + reach, shift => SumTail.Below(_draws, high - shift, withRim: true).Upper <= miss);
        double? down = _band.Low is not { } low ? null
            : Least(Math.Abs(low - _draws.Mean) + reach, shift => SumTail.Above(_draws, low + shift, withRim: true).Upper <= miss);
        return Nearer(up, down);
    }

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk)
    {
        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        return Least(100 * Math.Sqrt(_draws.Variance), half =>
            SumTail.Above(_draws, _draws.Mean + half, withRim: true).Upper + SumTail.Below(_draws, _draws.Mean - half, withRim: true).Upper <= risk);
    }
}
