using Assize.Bounds;
using MathNet.Numerics.Distributions;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Draws follow a known distribution: their share up to any point is what it says, give or take a tolerance.</summary>
    /// <param name="law">The distribution, continuous or discrete.</param>
    /// <param name="tolerance">The greatest difference of shares that is still right, in [0, 1).</param>
    /// <param name="defect">The difference that must be caught: above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about the whole distribution of the draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static DistributionClaim Follows(IUnivariateDistribution law, double tolerance, double? defect = null)
    {
        ArgumentNullException.ThrowIfNull(law);
        return new(Cumulative.Of(law), $"{law}".Trim(), new(tolerance, defect));
    }

    /// <summary>Draws follow the distribution of a cumulative function: a jump in it is a value that comes again and again.</summary>
    /// <param name="cumulative">For any point, the share of draws up to it: never falling, in [0, 1].</param>
    /// <param name="tolerance">The greatest difference of shares that is still right, in [0, 1).</param>
    /// <param name="defect">The difference that must be caught: above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about the whole distribution of the draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static DistributionClaim Follows(Func<double, double> cumulative, double tolerance, double? defect = null)
    {
        ArgumentNullException.ThrowIfNull(cumulative);
        return new(cumulative, "the given distribution", new(tolerance, defect));
    }
}

/// <summary>A claim about the whole distribution of a draw.</summary>
public sealed record DistributionClaim : Claim<double>
{
    readonly Func<double, double> _cumulative;
    readonly string _name;
    readonly DistanceNumbers _numbers;

    internal DistributionClaim(Func<double, double> cumulative, string name, DistanceNumbers numbers) =>
        (_cumulative, _name, _numbers) = (cumulative, name, numbers);

    internal override string Sentence => $"draws follow {_name}, {_numbers.Sentence}";

    internal override Statement Statement => new("distribution", "distance", 0, _numbers.Tolerance, _numbers.Defect, _numbers.Edges);

    /// <inheritdoc/>
    public override Plan Plan() => DistanceNumbers.PlanOf(Distribution());

    private protected override IRace<double> Start()
    {
        var plan = Distribution();
        return ExactTrials(() => plan.FixedTrials) is { } trials
            ? new DistributionRace(plan.Once(trials), _cumulative, null)
            : new DistributionRace(plan, _cumulative, Terms.TrialCap);
    }

    DistributionPlan Distribution() => DistributionPlan.For(_numbers.Tolerance, _numbers.Defect, Risk, Confidence);
}
