using Assize.Bounds;

namespace Assize;

/// <summary>The bets on many rates, their levels and where a race about them ends: the fixed plan for a reserved tenth of
/// both error probabilities, frozen before trial 1.</summary>
sealed class ManyStakes
{
    const double Reserve = 0.1;

    readonly Lazy<ManyRatesPlan> _last;
    readonly Lazy<IReadOnlyList<(long Low, long High)>> _limits;

    ManyStakes(ManyRatesPlan plan)
    {
        Plan = plan;
        Bets = [.. plan.Kinds.Select(kind => new RateBets(kind))];
        LogRed = -Elementary.Log((1 - Reserve) * plan.Risk);
        LogGreen = -Elementary.Log((1 - Reserve) * plan.Miss);
        _last = new(() => plan.Share(Reserve));
        _limits = new(() => _last.Value.LimitsAt(_last.Value.Trials));
    }

    public static ManyStakes Of(ManyRatesPlan plan) => new(plan);

    /// <summary>The fixed plan for all of both error probabilities.</summary>
    public ManyRatesPlan Plan { get; }

    /// <summary>The bets for each kind of rate.</summary>
    public IReadOnlyList<RateBets> Bets { get; }

    /// <summary>Logarithm of the evidence that refutes.</summary>
    public double LogRed { get; }

    /// <summary>Logarithm of the evidence that rules out one defect.</summary>
    public double LogGreen { get; }

    /// <summary>The trial at which a race ends at the latest.</summary>
    public long Trials => _last.Value.Trials;

    /// <summary>What decides there, for each kind.</summary>
    public IReadOnlyList<(long Low, long High)> Limits => _limits.Value;

    public Plan ToPlan() => new(() => null, () => [])
    {
        FixedTrials = Plan.Trials,
        FirstTrials = Plan.Trials,
        TrialCap = Trials,
        Theorem = Plan.Theorem,
    };
}
