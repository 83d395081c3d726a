using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Two sources have the same distribution: their shares up to any point agree, give or take a tolerance.</summary>
    /// <param name="tolerance">The greatest difference of shares that is still right, in [0, 1).</param>
    /// <param name="defect">The difference that must be caught: above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about two sources, each on a stream of its own.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static SameDistributionClaim SameDistribution(double tolerance, double? defect = null) => new(new(tolerance, defect));
}

/// <summary>A claim that two sources have the same distribution. They always draw from streams of their own, since what is
/// known about two sources takes them to be independent.</summary>
public sealed record SameDistributionClaim : Comparison<double>
{
    readonly DistanceNumbers _numbers;

    internal SameDistributionClaim(DistanceNumbers numbers)
    {
        _numbers = numbers;
        Apart = true;
    }

    internal override string Sentence => $"both sources have the same distribution, {_numbers.Sentence}";

    internal override Statement Statement => new("same distribution", "distance", 0, _numbers.Tolerance, _numbers.Defect, _numbers.Edges);

    /// <inheritdoc/>
    public override Plan Plan() => DistanceNumbers.PlanOf(Pair());

    private protected override IRace<(double One, double Other)> Start()
    {
        var plan = Pair();
        return ExactTrials(() => plan.FixedTrials) is { } trials
            ? new SameDistributionRace(plan.Once(trials), null)
            : new SameDistributionRace(plan, Terms.TrialCap);
    }

    DistributionPlan Pair() => DistributionPlan.ForPair(_numbers.Tolerance, _numbers.Defect, Risk, Confidence);
}
