using Assize.Bounds;

namespace Assize;

/// <summary>A mean of which nothing is known yet. Give one fact about a draw; then it can be judged.</summary>
/// <remarks>Facts must hold for defective code too: what is only right when the code is right cannot prove that a defect
/// would be caught.</remarks>
public readonly record struct MeanWithoutFacts
{
    readonly MeanNumbers _numbers;

    internal MeanWithoutFacts(MeanNumbers numbers) => _numbers = numbers;

    /// <summary>No draw ever lies outside a range. One that does is refuted at once, with its trial.</summary>
    /// <param name="lower">The least possible draw; same unit as the target.</param>
    /// <param name="upper">The greatest possible draw, above <paramref name="lower"/>.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The range is empty or not finite, or leaves nothing to catch.</exception>
    public MeanClaim DrawsBetween(double lower, double upper) => With(MeanFacts.None.Between(lower, upper));

    /// <summary>The standard deviation of a draw never exceeds a bound. Draws that show it does refute the
    /// claim.</summary>
    /// <param name="standardDeviation">The bound, above 0; same unit as the target.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0.</exception>
    public MeanClaim DrawsDeviateAtMost(double standardDeviation) => With(MeanFacts.None.DeviatingAtMost(standardDeviation));

    /// <summary>The tails of a draw are never heavier than those of a normal distribution.</summary>
    /// <param name="proxy">The standard deviation of that normal distribution, above 0; same unit as the target.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0.</exception>
    public MeanClaim DrawsSubGaussian(double proxy) => With(MeanFacts.None.SubGaussian(proxy));

    /// <summary>No draw is ever negative, and the mean of its square has a bound: waits, sizes, counts.</summary>
    /// <param name="secondMoment">At least the mean of the square of a draw, above 0; in the square of the target's unit.</param>
    /// <returns>A claim that can be judged.</returns>
    /// <exception cref="ClaimRefusedException">The bound is not above 0.</exception>
    public MeanClaim DrawsNonNegative(double secondMoment) => With(MeanFacts.None.NonNegative(secondMoment));

    MeanClaim With(MeanFacts facts) => _numbers.In is null
        ? throw new ClaimRefusedException("A mean is claimed by Claim.Mean, Claim.MeanAtLeast or Claim.MeanAtMost.")
        : new MeanClaim(_numbers, facts);
}
