using Assize.Bounds;

namespace Assize;

/// <summary>How the two error probabilities of a claim about a mean are spent: nine tenths on bets, one tenth on the
/// trial that ends a race, and of the risk a twentieth on a fact that the draws themselves can contradict.</summary>
sealed class MeanStakes
{
    const double Reserve = 0.1;
    const double FactShare = 0.05;

    readonly Lazy<MeanCap> _cap;

    MeanStakes(MeanPlan plan)
    {
        Plan = plan;
        _cap = new(NewCap);
        double fact = Deviation is null ? 0 : FactShare;
        LogRed = -Elementary.Log((1 - Reserve - fact) * plan.Risk);
        LogGreen = -Elementary.Log((1 - Reserve) * plan.Miss);
        LogFact = fact == 0 ? double.PositiveInfinity : -Elementary.Log(fact * plan.Risk);
    }

    public static MeanStakes Of(MeanPlan plan) => new(plan);

    /// <summary>The fixed plan for all of both error probabilities.</summary>
    public MeanPlan Plan { get; }

    /// <summary>The fixed plan for what the watch over a fact leaves.</summary>
    public MeanPlan Fixed => Deviation is null ? Plan : Plan.Share(1 - FactShare, 1);

    /// <summary>Logarithm of the evidence that refutes.</summary>
    public double LogRed { get; }

    /// <summary>Logarithm of the evidence that rules out a defect.</summary>
    public double LogGreen { get; }

    /// <summary>Logarithm of the evidence that refutes the bound on the standard deviation.</summary>
    public double LogFact { get; }

    /// <summary>The bound on the standard deviation that is watched; null when there is none.</summary>
    public double? Deviation => Plan.Facts.StandardDeviation;

    MeanFacts Facts => Plan.Facts;

    public Plan ToPlan()
    {
        return new Plan(() => null, () => Plan.Theorems)
        {
            FixedTrials = Fixed.Trials,
            FirstTrials = Fixed.Trials,
            TrialCap = _cap.Value.Trials,
            Theorem = Fixed.Theorem,
        };
    }

    /// <summary>What ends a race: a rule before its first draw.</summary>
    public MeanCap Cap() => _cap.Value.Fresh();

    MeanCap NewCap()
    {
        if (!Plan.IsByInfluence)
            return AverageCap.For(Plan, Reserve);

        var last = Plan.Share(Reserve, Reserve);
        return new InfluenceCap(last, last.Trials);
    }

    /// <summary>How far away a defect still gets a bet of its own.</summary>
    public double Reach => Facts.Range ?? 4 * Facts.StandardDeviation!.Value;

    /// <summary>The bets that these facts make fair.</summary>
    public MeanBets Bets(IReadOnlyList<MeanMember> members) => Facts switch
    {
        { Minimum: { } lower, Maximum: { } upper } => RangeBets.On(members, lower, upper, Prior(upper - lower)),
        { Proxy: { } proxy } => new SubGaussianBets(members, proxy),
        { SecondMoment: { } square } => new NonNegativeBets(members, square),
        _ => new DeviationBets(members, Facts.StandardDeviation!.Value),
    };

    /// <summary>An interval that these facts make valid.</summary>
    public MeanInterval Interval(long horizon) => Facts is { Minimum: { } lower, Maximum: { } upper }
        ? new RangeInterval(lower, upper, Plan.Miss)
        : new DeviationInterval(Facts.StandardDeviation!.Value, Math.Max(1, horizon / 100.0));

    double Prior(double range)
    {
        double greatest = range * range / 4;
        return Deviation is { } deviation ? Math.Min(greatest, deviation * deviation) : greatest;
    }
}
