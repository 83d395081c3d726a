namespace Assize.Bounds;

/// <summary>What an assertion on a p-value or on an interval does, when its own level is taken at its word.</summary>
public sealed class NominalAssessment : Assessment
{
    readonly double _level;
    readonly long _times;

    /// <summary>An assertion that fails with a nominal probability.</summary>
    /// <param name="level">The probability of red it declares, in [0, 1].</param>
    /// <param name="times">How often it is evaluated in one run, at least 1.</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public NominalAssessment(double level, long times)
    {
        Check.Probability(level, nameof(level));
        Check.AtLeast(times, 1, nameof(times));
        (_level, _times) = (level, times);
    }

    /// <inheritdoc/>
    public override string Theorem => "nominal level";

    /// <summary>Whether a test holds its level is another question: it is taken at its word.</summary>
    public override bool IsApproximate => true;

    /// <summary>At least the level of one evaluation, at most the union over all.</summary>
    public override Enclosure FalseFailure => new(_level * (1 - 1e-15), Math.Min(1, _times * _level));
}
