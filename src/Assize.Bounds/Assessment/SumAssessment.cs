namespace Assize.Bounds;

/// <summary>What an assertion on the sum of draws of a known law does.</summary>
public sealed class SumAssessment : Assessment
{
    readonly Law _law;
    readonly long _trials;
    readonly Band _band;
    readonly Draws _draws;
    readonly Lazy<Enclosure> _falseFailure;

    /// <summary>An assertion on a sum.</summary>
    /// <param name="law">The law of one draw on right code, of positive variance.</param>
    /// <param name="trials">Number of draws, in [1, 2^52].</param>
    /// <param name="band">The sums that pass.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public SumAssessment(Law law, long trials, Band band)
    {
        _draws = Draws.Of(law, trials);
        TiltedSum.RequireVariance(_draws);
        (_law, _trials, _band) = (law, trials, band ?? throw new ArgumentNullException(nameof(band)));
        _falseFailure = new(Red);
    }

    /// <inheritdoc/>
    public override string Theorem => SumTail.TheoremFor(_draws);

    /// <inheritdoc/>
    public override Enclosure FalseFailure => _falseFailure.Value;

    /// <summary>The smallest shift of the law, trial by trial, that the assertion catches.</summary>
    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence)
    {
        Check.Inside(confidence, 0, 1, nameof(confidence));
        double miss = Decimals.Complement(confidence);
        double spread = Math.Sqrt(_law.Variance);
        double? Shift(Func<double, Enclosure> green, double rim) =>
            Least(Math.Abs(rim / _trials - _law.Mean) + 60 * spread, shift => green(shift * _trials).Upper <= miss);

        double? up = _band.High is { } high ? Shift(by => SumTail.Below(_draws, high - by, withRim: true), high) : null;
        double? down = _band.Low is { } low ? Shift(by => SumTail.Above(_draws, low + by, withRim: true), low) : null;
        return Nearer(up, down);
    }

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        var means = _band.Times(1.0 / _trials);
        if (means.Low >= _law.Mean || means.High <= _law.Mean)
            return null;

        // Each factor of the tilted bound, e^(-nI)·(M(t) + 2D), falls with the number of draws when the level of the
        // average stays.
        double Red(long trials)
        {
            var draws = Draws.Of(_law, trials);
            double above = means.High is { } high ? TiltedSum.UpperTail(draws, trials * high).Upper : 0;
            double below = means.Low is { } low ? TiltedSum.LowerTail(draws, trials * low).Upper : 0;
            return above + below;
        }

        return RateTheorem.First(_trials, trials => Red(trials) <= risk);
    }

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk)
    {
        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        double centre = _draws.Mean, spread = Math.Sqrt(_draws.Variance);
        return Least(100 * spread + 1000 * Math.Sqrt(_law.Variance), half =>
            SumTail.Above(_draws, centre + half, withRim: true).Upper + SumTail.Below(_draws, centre - half, withRim: true).Upper <= risk);
    }

    Enclosure Red()
    {
        var none = new Enclosure(0, 0);
        var above = _band.High is { } high ? SumTail.Above(_draws, high, withRim: !_band.HighPasses) : none;
        var below = _band.Low is { } low ? SumTail.Below(_draws, low, withRim: !_band.LowPasses) : none;
        return Sum(above, below);
    }
}
