using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>The mean of a draw is the target, give or take a tolerance.</summary>
    /// <param name="target">The mean claimed, finite.</param>
    /// <param name="tolerance">How far from the target is still right: a distance, 0 allowed.</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim that needs a fact about a draw before it can be judged.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or is NaN.</exception>
    public static MeanWithoutFacts Mean(double target, double tolerance, double? defect = null) =>
        new(MeanNumbers.Around(target, tolerance, defect));

    /// <summary>The mean of a draw is the target or more.</summary>
    /// <param name="target">The least mean that is right, finite.</param>
    /// <param name="defect">How far below the target must be caught: a distance above 0.</param>
    /// <returns>A claim that needs a fact about a draw before it can be judged.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or is NaN.</exception>
    public static MeanWithoutFacts MeanAtLeast(double target, double defect) => new(MeanNumbers.AtLeast(target, defect));

    /// <summary>The mean of a draw is the target or less.</summary>
    /// <param name="target">The greatest mean that is right, finite.</param>
    /// <param name="defect">How far above the target must be caught: a distance above 0.</param>
    /// <returns>A claim that needs a fact about a draw before it can be judged.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or is NaN.</exception>
    public static MeanWithoutFacts MeanAtMost(double target, double defect) => new(MeanNumbers.AtMost(target, defect));
}

/// <summary>A claim about the mean of a draw.</summary>
public sealed record MeanClaim : Claim<double>
{
    readonly MeanNumbers _numbers;

    internal MeanClaim(MeanNumbers numbers, MeanFacts facts)
    {
        (_numbers, Facts) = (numbers, facts);
        Edges = numbers.In(new Domain(facts.Minimum ?? double.NegativeInfinity, facts.Maximum ?? double.PositiveInfinity));
    }

    /// <summary>What is known about a draw, whether the code is right or not.</summary>
    public MeanFacts Facts { get; }

    /// <summary>The target, the edges of what is right and the defects, as they are judged.</summary>
    public Edges Edges { get; }

    /// <inheritdoc cref="MeanWithoutFacts.DrawsBetween"/>
    public MeanClaim DrawsBetween(double lower, double upper) => Knowing(Facts.Between(lower, upper));

    /// <inheritdoc cref="MeanWithoutFacts.DrawsDeviateAtMost"/>
    public MeanClaim DrawsDeviateAtMost(double standardDeviation) => Knowing(Facts.DeviatingAtMost(standardDeviation));

    /// <inheritdoc cref="MeanWithoutFacts.DrawsSubGaussian"/>
    public MeanClaim DrawsSubGaussian(double proxy) => Knowing(Facts.SubGaussian(proxy));

    /// <inheritdoc cref="MeanWithoutFacts.DrawsNonNegative"/>
    public MeanClaim DrawsNonNegative(double secondMoment) => Knowing(Facts.NonNegative(secondMoment));

    internal override string Sentence => $"{Wording.Claimed("mean", Edges, _numbers.Tolerance)}, {Wording.Facts(Facts)}";

    internal override Statement Statement =>
        new("mean", "mean", _numbers.Target, _numbers.Tolerance, _numbers.Defect, Edges);

    /// <inheritdoc/>
    public override Plan Plan() => Stakes().ToPlan();

    private protected override IRace<double> Start() => NewRace();

    internal IRace<double> NewRace()
    {
        var stakes = Stakes();
        return ExactTrials(() => stakes.Fixed.Trials) is { } trials
            ? new FixedMean(stakes, trials)
            : new MeanRace(stakes, Terms.TrialCap);
    }

    MeanStakes Stakes() => MeanStakes.Of(MeanPlan.For(Edges, Facts, Risk, Confidence));

    MeanClaim Knowing(MeanFacts facts) => new(_numbers, facts) { Terms = Terms };
}
