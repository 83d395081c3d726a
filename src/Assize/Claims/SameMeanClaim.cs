using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Two sources have the same mean, give or take a tolerance.</summary>
    /// <param name="tolerance">How far apart the means may be: a distance, 0 allowed.</param>
    /// <param name="defect">How far apart must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim that needs a fact about the draws before it can be judged.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or is NaN.</exception>
    public static MeansWithoutFacts SameMean(double tolerance, double? defect = null) =>
        new(MeanNumbers.Around(0, tolerance, defect));
}

/// <summary>A claim that two means are the same: the mean of the difference of their draws is 0.</summary>
public sealed record SameMeanClaim : Comparison<double>
{
    readonly MeanNumbers _numbers;
    readonly MeanClaim _difference;

    internal SameMeanClaim(MeanNumbers numbers, MeanFacts facts) =>
        (_numbers, _difference) = (numbers, new MeanClaim(numbers, facts));

    /// <summary>Lets each source draw from a stream of its own, instead of both from the same.</summary>
    /// <returns>The claim on independent streams.</returns>
    public SameMeanClaim OnIndependentStreams() => this with { Apart = true };

    internal override string Sentence =>
        $"{Wording.Claimed("difference of the two means", _difference.Edges, _numbers.Tolerance)}, "
        + $"{Wording.Facts(_difference.Facts).Replace("draws", "differences", StringComparison.Ordinal)}";

    internal override Statement Statement =>
        new("same mean", "difference", 0, _numbers.Tolerance, _numbers.Defect, _difference.Edges);

    /// <inheritdoc/>
    public override Plan Plan() => AsMean.Plan();

    private protected override IRace<(double One, double Other)> Start() =>
        new MappedRace<(double One, double Other), double>(AsMean.NewRace(), pair => pair.One - pair.Other);

    MeanClaim AsMean => _difference with { Terms = Terms };
}
