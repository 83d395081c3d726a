using Assize.Bounds;

namespace Assize;

/// <summary>Two means of which nothing is known yet. Give one fact about the draws; then they can be compared.</summary>
public readonly record struct MeansWithoutFacts
{
    readonly MeanNumbers _numbers;

    internal MeansWithoutFacts(MeanNumbers numbers) => _numbers = numbers;

    /// <summary>No draw of either source ever lies outside a range.</summary>
    /// <param name="lower">The least possible draw.</param>
    /// <param name="upper">The greatest possible draw, above <paramref name="lower"/>.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The range is empty or not finite, or leaves nothing to catch.</exception>
    public SameMeanClaim DrawsBetween(double lower, double upper)
    {
        MeanFacts.None.Between(lower, upper);
        return With(MeanFacts.None.Between(lower - upper, upper - lower));
    }

    /// <summary>The standard deviation of the difference of two draws never exceeds a bound.</summary>
    /// <param name="standardDeviation">The bound, above 0.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0.</exception>
    public SameMeanClaim DifferenceDeviatesAtMost(double standardDeviation) =>
        With(MeanFacts.None.DeviatingAtMost(standardDeviation));

    SameMeanClaim With(MeanFacts facts) => _numbers.In is null
        ? throw new ClaimRefusedException("Means are compared by Claim.SameMean.")
        : new SameMeanClaim(_numbers, facts);
}
