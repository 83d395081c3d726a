using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>The rate of successes among the trials that qualify is the target, give or take a tolerance. A trial yields null
    /// when it does not qualify: it is passed over and counted.</summary>
    /// <param name="target">The rate claimed, in [0, 1].</param>
    /// <param name="tolerance">How far from the target is still right: a distance, 0 allowed.</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about draws of yes, no or neither.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static ConditionalRateClaim RateWhenItQualifies(double target, double tolerance, double? defect = null) =>
        new(Rate(target, tolerance, defect));
}

/// <summary>A claim about how often something happens among the trials that qualify.</summary>
public sealed record ConditionalRateClaim : Claim<bool?>
{
    readonly RateClaim _rate;

    internal ConditionalRateClaim(RateClaim rate) => _rate = rate;

    /// <summary>The target, the edges of what is right and the defects.</summary>
    public Edges Edges => _rate.Edges;

    internal override string Sentence => $"among trials that qualify, {_rate.Sentence}";

    internal override Statement Statement => _rate.Statement with { Family = "conditional rate" };

    /// <inheritdoc/>
    public override Plan Plan() => AsRate.Plan();

    private protected override IRace<bool?> Start() => new QualifyingRace(AsRate.NewRace());

    RateClaim AsRate => _rate with { Terms = Terms };
}
