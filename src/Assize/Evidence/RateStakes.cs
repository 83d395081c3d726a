using Assize.Bounds;

namespace Assize;

/// <summary>A race's bets, their levels and where it ends: the fixed plan for a reserved tenth of both error
/// probabilities, frozen before trial 1.</summary>
sealed class RateStakes
{
    const double Reserve = 0.1;

    readonly double _red;
    readonly double _redOfOne;
    readonly double _green;

    RateStakes(RatePlan plan, double targetShare)
    {
        Plan = plan;
        Bets = new RateBets(plan.Edges, targetShare);
        // Where one contrary draw refutes, the plan's own trials end the race and spend no risk: nothing is reserved.
        bool isZeroFailures = ZeroFailures.Applies(plan.Edges);
        double share = isZeroFailures ? 1 : 1 - Reserve;
        var last = isZeroFailures ? plan : plan.Share(Reserve);
        (_red, _green) = (-Elementary.Log(share * plan.Risk), -Elementary.Log(share * plan.Miss));
        // A side that is ahead has the other below 1, its bets being worse than the edge: so E/2 + 1/2 must reach the level.
        bool isTwoSided = Bets is { ClaimFromAbove: not null, ClaimFromBelow: not null };
        _redOfOne = isTwoSided ? _red + Elementary.LogOnePlus(1 - share * plan.Risk) : _red;
        Trials = last.FirstTrials;
        Limits = last.LimitsAt(Trials);
    }

    /// <summary>The fixed plan for all of both error probabilities.</summary>
    public RatePlan Plan { get; }

    public RateBets Bets { get; }

    /// <summary>The trial at which the race ends at the latest.</summary>
    public long Trials { get; }

    /// <summary>What decides there.</summary>
    public RateLimits Limits { get; }

    /// <summary>The stakes for a plan; the share is what a bet against a defect puts on the target rather than the
    /// edge.</summary>
    public static RateStakes Of(RatePlan plan, double targetShare = 0.5) => new(plan, targetShare);

    /// <summary>Whether the evidence against the claim has reached its level.</summary>
    public bool Refutes(long trials, long successes) =>
        Bet.Average(Bets.ClaimFromAbove, Bets.ClaimFromBelow, trials, successes).AtLeast >= _red;

    /// <summary>Whether the evidence against a defect above has reached its level; without such a defect,
    /// always.</summary>
    public bool ExcludesAbove(long trials, long successes) =>
        Bets.DefectAbove is not { } bet || bet.Wealth(trials, successes).AtLeast >= _green;

    /// <summary>Whether the evidence against a defect below has reached its level; without such a defect,
    /// always.</summary>
    public bool ExcludesBelow(long trials, long successes) =>
        Bets.DefectBelow is not { } bet || bet.Wealth(trials, successes).AtLeast >= _green;

    /// <summary>The triggers at a number of trials; quick when those of a nearby number are given.</summary>
    public Triggers TriggersAt(long trials, Triggers near) => new(
        Bets.ClaimFromAbove?.LeastSuccesses(trials, _redOfOne, near.RedFrom) ?? trials + 1,
        Bets.ClaimFromBelow?.GreatestSuccesses(trials, _redOfOne, near.RedTo) ?? -1,
        Bets.DefectAbove?.GreatestSuccesses(trials, _green, near.NotAboveTo) ?? -1,
        Bets.DefectBelow?.LeastSuccesses(trials, _green, near.NotBelowFrom) ?? trials + 1);
}
