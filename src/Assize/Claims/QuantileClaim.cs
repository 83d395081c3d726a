using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>A value is the quantile of a draw, give or take a share of the draws; for any distribution, with or without
    /// ties.</summary>
    /// <param name="probability">The share of draws up to the value, in (0, 1).</param>
    /// <param name="value">The quantile claimed, finite.</param>
    /// <param name="tolerance">How far the share may be from its target: a distance, 0 allowed.</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about the draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static QuantileClaim Quantile(double probability, double value, double tolerance, double? defect = null) =>
        new(probability, value, tolerance, defect ?? 2 * tolerance);

    /// <summary>A value is the median of a draw, give or take a share of the draws.</summary>
    /// <param name="value">The median claimed, finite.</param>
    /// <param name="tolerance">How far the share of draws up to it may be from one half: a distance, 0 allowed.</param>
    /// <param name="defect">How far from one half must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about the draws.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static QuantileClaim Median(double value, double tolerance, double? defect = null) =>
        Quantile(0.5, value, tolerance, defect);
}

/// <summary>A claim about a quantile: P(draw &lt; value) is not too great and P(draw ≤ value) not too small.</summary>
public sealed record QuantileClaim : Claim<double>
{
    internal QuantileClaim(double probability, double value, double tolerance, double defect)
    {
        if (!(probability is > 0 and < 1))
            throw new ClaimRefusedException($"The probability of a quantile lies between 0 and 1; it is {Wording.Exact(probability)}.");
        if (!double.IsFinite(value))
            throw new ClaimRefusedException($"The value of a quantile is a finite number; it is {Wording.Exact(value)}.");

        Edges = Edges.Around(Domain.Rate, probability, tolerance, defect == 2 * tolerance && tolerance == 0 ? null : defect);
        (Value, Tolerance, Defect) = (value, tolerance, defect);
    }

    /// <summary>The quantile claimed.</summary>
    public double Value { get; }

    /// <summary>How far the share of draws may be from its target.</summary>
    public double Tolerance { get; }

    /// <summary>How far the share of draws from its target is caught.</summary>
    public double Defect { get; }

    /// <summary>The target, the edges and the defects of the share of draws.</summary>
    public Edges Edges { get; }

    internal override string Sentence => (Edges.Target == 0.5 ? "the median" : $"the {Wording.Number(Edges.Target)} quantile")
        + $" is {Wording.Number(Value)}, give or take {Wording.Number(Tolerance)} of the draws {Wording.Caught(Edges)}";

    internal override Statement Statement => new("quantile", "share", Edges.Target, Tolerance, Defect, Edges);

    /// <inheritdoc/>
    public override Plan Plan()
    {
        RateStakes[] sides = [.. Sides().Select(side => RateStakes.Of(side))];
        return new Plan(() => null, () => Longer(sides).Plan.Theorems)
        {
            FixedTrials = sides.Max(side => side.Plan.Trials),
            FirstTrials = sides.Max(side => side.Plan.FirstTrials),
            TrialCap = sides.Max(side => side.Trials),
            Theorem = Longer(sides).Plan.Theorem,
        };
    }

    private protected override IRace<double> Start()
    {
        var sides = Sides().ToList();
        long? trials = ExactTrials(() => sides.Max(side => side.Trials));
        IRace<bool>? Race(bool upper) => sides.Find(side => side.Edges.UpperDefect is not null == upper) is not { } plan ? null
            : trials is { } exactly ? new FixedRate(plan, plan.LimitsAt(exactly))
            : new RateRace(RateStakes.Of(plan), Terms.TrialCap);
        return new QuantileRace(Value, Race(upper: true), Race(upper: false), sides[0]);
    }

    static RateStakes Longer(RateStakes[] sides) => sides.MaxBy(side => side.Plan.Trials)!;

    // A side whose defect lies outside [0, 1] has nothing to catch and asks for no trials.
    IEnumerable<RatePlan> Sides()
    {
        double risk = Edges is { LowerDefect: not null, UpperDefect: not null } ? Risk / 2 : Risk;
        if (Edges.UpperDefect is { } above)
            yield return RatePlan.For(Edges.Between(Domain.Rate, Edges.Target, null, null, Edges.UpperEdge, above), risk, Confidence);
        if (Edges.LowerDefect is { } below)
            yield return RatePlan.For(Edges.Between(Domain.Rate, Edges.Target, below, Edges.LowerEdge, null, null), risk, Confidence);
    }
}
