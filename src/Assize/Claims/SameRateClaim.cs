using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Two sources succeed equally often, give or take a tolerance.</summary>
    /// <param name="tolerance">How far apart the rates may be: a distance, 0 allowed.</param>
    /// <param name="defect">How far apart must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about two yes/no sources.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static SameRateClaim SameRate(double tolerance, double? defect = null) =>
        new(MeanNumbers.Around(0, tolerance, defect));
}

/// <summary>A claim that two rates are the same: the mean of their difference, draw by draw, is 0.</summary>
public sealed record SameRateClaim : Comparison<bool>
{
    readonly MeanClaim _difference;

    internal SameRateClaim(MeanNumbers numbers) =>
        (_numbers, _difference) = (numbers, new MeanClaim(numbers, MeanFacts.None.Between(-1, 1)));

    readonly MeanNumbers _numbers;

    /// <summary>Lets each source draw from a stream of its own, instead of both from the same.</summary>
    /// <returns>The claim on independent streams.</returns>
    public SameRateClaim OnIndependentStreams() => this with { Apart = true };

    internal override string Sentence =>
        $"{Wording.Claimed("difference of the two rates", _difference.Edges, _numbers.Tolerance)}";

    internal override Statement Statement =>
        new("same rate", "difference", 0, _numbers.Tolerance, _numbers.Defect, _difference.Edges);

    /// <inheritdoc/>
    public override Plan Plan() => AsMean.Plan();

    private protected override IRace<(bool One, bool Other)> Start() => new MappedRace<(bool One, bool Other), double>(
        AsMean.NewRace(), pair => (pair.One ? 1 : 0) - (pair.Other ? 1 : 0));

    MeanClaim AsMean => _difference with { Terms = Terms };
}
