namespace Assize.Bounds;

/// <summary>What an assertion does that the draws' empirical distribution stays near a continuous one.</summary>
public sealed class DistributionAssessment : Assessment
{
    readonly long _trials;
    readonly double _distance;
    readonly Lazy<Enclosure> _falseFailure;

    /// <summary>An assertion on the greatest distance between the two distribution functions.</summary>
    /// <param name="trials">Number of draws, at least 1.</param>
    /// <param name="distance">From this distance on it is red, in (0, 1].</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public DistributionAssessment(long trials, double distance)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(distance, double.Epsilon, 1, nameof(distance));
        (_trials, _distance) = (trials, distance);
        _falseFailure = new(() => KolmogorovTail.TwoSided(trials, distance));
    }

    /// <inheritdoc/>
    public override string Theorem => "exact Kolmogorov";

    /// <inheritdoc/>
    public override Enclosure FalseFailure => _falseFailure.Value;

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        return Massart.EitherTrialsNeeded(_distance, Math.Min(risk, 1 - 1e-15));
    }

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk)
    {
        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        return Massart.EitherRadius(_trials, risk);
    }
}
