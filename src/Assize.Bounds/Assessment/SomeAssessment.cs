namespace Assize.Bounds;

/// <summary>What an assertion does that something happens at least once.</summary>
public sealed class SomeAssessment : Assessment
{
    readonly double _rate;
    readonly long _trials;

    /// <summary>An assertion that at least one trial succeeds.</summary>
    /// <param name="rate">The rate on right code, in [0, 1].</param>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public SomeAssessment(double rate, long trials)
    {
        Check.Probability(rate, nameof(rate));
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        (_rate, _trials) = (rate, trials);
    }

    /// <inheritdoc/>
    public override string Theorem => BinomialTail.Name;

    /// <inheritdoc/>
    public override Enclosure FalseFailure => BinomialTail.Between(_trials, 0, 0, _rate);

    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence) =>
        ProportionAssessment.SmallestDefectCaught(_trials, 1, _trials, _rate, confidence);

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        return _rate == 0 ? null : RateTheorem.First(_trials, trials => BinomialTail.Between(trials, 0, 0, _rate).Upper <= risk);
    }
}
