using Assize.Bounds;

namespace Assize;

/// <summary>A standard deviation about whose draws nothing is known yet. Give one fact; then it can be judged.</summary>
public readonly record struct SpreadWithoutFacts
{
    readonly SpreadNumbers? _numbers;

    internal SpreadWithoutFacts(SpreadNumbers numbers) => _numbers = numbers;

    /// <summary>No draw ever lies outside a range. One that does is refuted at once, with its trial.</summary>
    /// <param name="lower">The least possible draw; same unit as the target.</param>
    /// <param name="upper">The greatest possible draw, above <paramref name="lower"/>.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The range is empty or not finite, or leaves nothing to catch.</exception>
    public SpreadClaim DrawsBetween(double lower, double upper) => new(Numbers(), MeanFacts.None.Between(lower, upper));

    /// <summary>Draws are normal, of whatever mean.</summary>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The target is 0.</exception>
    public NormalSpreadClaim DrawsNormal() => new(Numbers());

    SpreadNumbers Numbers() => _numbers ?? throw new ClaimRefusedException(
        "A standard deviation is claimed by Claim.StandardDeviation or Claim.StandardDeviationAtMost.");
}
