using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>The standard deviation of a draw is the target, give or take a tolerance.</summary>
    /// <param name="target">The standard deviation claimed, above 0.</param>
    /// <param name="tolerance">How far from the target is still right: a distance, 0 allowed.</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim that needs a fact about a draw before it can be judged.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or is NaN.</exception>
    public static SpreadWithoutFacts StandardDeviation(double target, double tolerance, double? defect = null) =>
        new(new SpreadNumbers(Edges.Around(SpreadNumbers.Domain, target, tolerance, defect), tolerance, defect ?? 2 * tolerance));

    /// <summary>The standard deviation of a draw is the target or less.</summary>
    /// <param name="target">The greatest standard deviation that is right, 0 or more.</param>
    /// <param name="defect">How far above the target must be caught: a distance above 0.</param>
    /// <returns>A claim that needs a fact about a draw before it can be judged.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or is NaN.</exception>
    public static SpreadWithoutFacts StandardDeviationAtMost(double target, double defect) =>
        new(new SpreadNumbers(Edges.AtMost(SpreadNumbers.Domain, target, defect), 0, defect));
}

/// <summary>A claim about the standard deviation of draws in a range: half the squared difference of two draws has the
/// variance as its mean.</summary>
public sealed record SpreadClaim : Claim<double>
{
    readonly SpreadNumbers _numbers;
    readonly MeanFacts _facts;

    internal SpreadClaim(SpreadNumbers numbers, MeanFacts facts)
    {
        (_numbers, _facts) = (numbers, facts);
        double range = facts.Range!.Value;
        // The greatest variance in a range is that of the two ends, half each (T. Popoviciu 1935).
        if (!(numbers.Edges.Target <= range / 2))
            throw new ClaimRefusedException($"Draws between {Wording.Number(facts.Minimum!.Value)} and {Wording.Number(facts.Maximum!.Value)} "
                + $"have a standard deviation of {Wording.Number(range / 2)} at most; claimed is {Wording.Number(numbers.Edges.Target)}.");

        OfVariance = numbers.OfVariance(range);
    }

    /// <summary>The target, the edges and the defects of the standard deviation.</summary>
    public Edges Edges => _numbers.Edges;

    Edges OfVariance { get; }

    internal override string Sentence =>
        $"{Wording.Claimed("standard deviation", Edges, _numbers.Tolerance)}, {Wording.Facts(_facts)}";

    internal override Statement Statement =>
        new("standard deviation", "sd", Edges.Target, _numbers.Tolerance, _numbers.Defect, Edges);

    /// <inheritdoc/>
    public override Plan Plan()
    {
        var stakes = Stakes();
        var plan = stakes.ToPlan();
        return new Plan(() => null, () => plan.Alternatives)
        {
            FixedTrials = 2 * plan.FixedTrials,
            FirstTrials = 2 * plan.FirstTrials,
            TrialCap = 2 * plan.TrialCap,
            Theorem = plan.Theorem,
        };
    }

    private protected override IRace<double> Start()
    {
        var stakes = Stakes();
        long? exactly = ExactTrials(() => 2 * stakes.Fixed.Trials);
        IRace<double> race = exactly is { } trials
            ? new FixedMean(stakes, trials / 2)
            : new MeanRace(stakes, Terms.TrialCap / 2);
        return new PairRace(race, _facts);
    }

    MeanStakes Stakes()
    {
        double range = _facts.Range!.Value;
        return MeanStakes.Of(MeanPlan.For(OfVariance, MeanFacts.None.Between(0, range * range / 2), Risk, Confidence));
    }
}
