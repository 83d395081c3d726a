using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>The rate of successes is the target, give or take a tolerance.</summary>
    /// <param name="target">The rate claimed, in [0, 1].</param>
    /// <param name="tolerance">How far from the target is still right: a distance, 0 allowed.</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about yes/no draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static RateClaim Rate(double target, double tolerance, double? defect = null) =>
        new(Edges.Around(Domain.Rate, target, tolerance, defect), target, tolerance, defect ?? 2 * tolerance);

    /// <summary>The rate of successes is the target or more.</summary>
    /// <param name="target">The least rate that is right, in (0, 1].</param>
    /// <param name="defect">How far below the target must be caught: a distance above 0.</param>
    /// <returns>A claim about yes/no draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static RateClaim RateAtLeast(double target, double defect) =>
        new(Edges.AtLeast(Domain.Rate, target, defect), target, 0, defect);

    /// <summary>The rate of successes is the target or less; a target of 0 says that it never happens.</summary>
    /// <param name="target">The greatest rate that is right, in [0, 1).</param>
    /// <param name="defect">How far above the target must be caught: a distance above 0.</param>
    /// <returns>A claim about yes/no draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static RateClaim RateAtMost(double target, double defect) =>
        new(Edges.AtMost(Domain.Rate, target, defect), target, 0, defect);

    /// <summary>It never happens: enough trials without it show that its rate is below a limit.</summary>
    /// <param name="limit">From this rate on it must be caught, in (0, 1).</param>
    /// <returns>A claim about yes/no draws; the first yes refutes it.</returns>
    /// <exception cref="ClaimRefusedException">The limit lies outside its domain, or is NaN.</exception>
    public static RateClaim NeverAbove(double limit) => RateAtMost(0, limit);
}

/// <summary>A claim about how often something happens.</summary>
public sealed record RateClaim : Claim<bool>
{
    internal RateClaim(Edges edges, double target, double tolerance, double defect) =>
        (Edges, Target, Tolerance, Defect) = (edges, target, tolerance, defect);

    /// <summary>The rate claimed, in [0, 1].</summary>
    public double Target { get; }

    /// <summary>How far from the target is still right: a distance, 0 or more.</summary>
    public double Tolerance { get; }

    /// <summary>How far from the target is caught: a distance above the tolerance.</summary>
    public double Defect { get; }

    /// <summary>The target, the edges of what is right and the defects, as they are judged.</summary>
    public Edges Edges { get; }

    internal override string Sentence => Wording.Rate(Edges, Tolerance);

    internal override Statement Statement => new("rate", "rate", Target, Tolerance, Defect, Edges);

    /// <inheritdoc/>
    public override Plan Plan() => Assize.Plan.Of(Stakes());

    private protected override IRace<bool> Start() => NewRace();

    internal IRace<bool> NewRace()
    {
        var plan = RatePlan.For(Edges, Risk, Confidence);
        return ExactTrials(() => plan.Trials) is { } trials
            ? new FixedRate(plan, plan.LimitsAt(trials))
            : new RateRace(RateStakes.Of(plan), Terms.TrialCap);
    }

    RateStakes Stakes() => RateStakes.Of(RatePlan.For(Edges, Risk, Confidence));
}
