using Assize.Bounds;

namespace Assize;

/// <summary>A claim about the standard deviation of normal draws.</summary>
public sealed record NormalSpreadClaim : Claim<double>
{
    readonly SpreadNumbers _numbers;

    internal NormalSpreadClaim(SpreadNumbers numbers)
    {
        _numbers = numbers;
        if (!(numbers.Edges.Target > 0))
            throw new ClaimRefusedException("Normal draws have a standard deviation above 0; claimed is 0.");
    }

    /// <summary>The target, the edges and the defects of the standard deviation.</summary>
    public Edges Edges => _numbers.Edges;

    internal override string Sentence =>
        $"{Wording.Claimed("standard deviation", Edges, _numbers.Tolerance)}, draws normal";

    internal override Statement Statement =>
        new("standard deviation", "sd", Edges.Target, _numbers.Tolerance, _numbers.Defect, Edges);

    /// <inheritdoc/>
    public override Plan Plan()
    {
        var plan = Fixed();
        return new Plan(() => null, () => [new TheoremTrials(NormalSpreadPlan.Theorem, plan.Trials, "independent normal draws")])
        {
            FixedTrials = plan.Trials,
            FirstTrials = plan.Trials,
            TrialCap = new NormalSpreadRace(plan, null, null).LastTrial,
            Theorem = NormalSpreadPlan.Theorem,
        };
    }

    private protected override IRace<double> Start()
    {
        var plan = Fixed();
        return new NormalSpreadRace(plan, ExactTrials(() => plan.Trials), Terms.TrialCap);
    }

    NormalSpreadPlan Fixed() => NormalSpreadPlan.For(Edges, Risk, Confidence);
}
