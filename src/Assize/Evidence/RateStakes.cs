using System.Collections.Concurrent;
using Assize.Bounds;

namespace Assize;

/// <summary>A race's stakes and where it ends: the fixed plan for a reserved tenth of both error probabilities, frozen before trial 1.</summary>
sealed class RateStakes
{
    const double Reserve = 0.1;

    // Triggers are looser than the exact test by more than its rounding.
    const double TriggerSlack = 1e-9;

    // Planning takes milliseconds and claims are judged again and again, row by row.
    static readonly ConcurrentDictionary<(Edges, double, double), RateStakes> Known = new();

    const double LogTwo = 0.693147180559945309417;

    readonly double _red;
    readonly double _green;

    RateStakes(RatePlan plan, double targetShare)
    {
        Bets = new RateBets(plan.Edges, targetShare);
        // Where one contrary draw refutes, the other bet is deterministic: no draw can lead to the cap, so nothing is reserved.
        double reserve = ZeroFailures.Applies(plan.Edges) ? 0 : Reserve;
        (Risk, Miss) = ((1 - reserve) * plan.Risk, (1 - reserve) * plan.Miss);
        (_red, _green) = (-Elementary.Log(Risk), -Elementary.Log(Miss));
        var reserved = reserve == 0 ? plan : plan.Share(reserve);
        Trials = reserved.FirstTrials;
        Limits = reserved.LimitsAt(Trials);
    }

    public RateBets Bets { get; }

    public double Risk { get; }

    public double Miss { get; }

    public long Trials { get; }

    public RateLimits Limits { get; }

    /// <summary>Whether the evidence against the claim has reached its level.</summary>
    public bool Refutes(long trials, long successes) =>
        Bet.LogAtLeast(Bets.ClaimFromAbove, Bets.ClaimFromBelow, trials, successes) >= _red;

    /// <summary>Whether the evidence against a defect above has reached its level; without such a defect, always.</summary>
    public bool ExcludesAbove(long trials, long successes) =>
        Bets.DefectAbove is not { } bet || bet.LogAtLeast(trials, successes) >= _green;

    /// <summary>Whether the evidence against a defect below has reached its level; without such a defect, always.</summary>
    public bool ExcludesBelow(long trials, long successes) =>
        Bets.DefectBelow is not { } bet || bet.LogAtLeast(trials, successes) >= _green;

    /// <summary>Four limits that no exact test passes unless the count is at or beyond one of them.</summary>
    public Triggers Loose(long trials) => At(trials, _red - TriggerSlack, _green - TriggerSlack, null);

    /// <summary>The four limits to a hair, where the bets against the claim do not win together; quick when the guess is near.</summary>
    public Triggers Close(long trials, Triggers? guess) =>
        At(trials, _red + (Bets.ClaimFromAbove is null || Bets.ClaimFromBelow is null ? 0 : LogTwo), _green, guess);

    // An even average of two reaches a level only if one of them does.
    Triggers At(long trials, double red, double green, Triggers? guess) => new(
        Bets.ClaimFromAbove?.LeastSuccesses(trials, red, guess?.RedFrom) ?? long.MaxValue,
        Bets.ClaimFromBelow?.GreatestSuccesses(trials, red, guess?.RedTo) ?? -1,
        Bets.DefectAbove?.GreatestSuccesses(trials, green, guess?.NotAboveTo) ?? -1,
        Bets.DefectBelow?.LeastSuccesses(trials, green, guess?.NotBelowFrom) ?? long.MaxValue);

    public static RateStakes For(Edges edges, double risk, double confidence) =>
        Known.GetOrAdd((edges, risk, confidence), static key => Of(RatePlan.For(key.Item1, key.Item2, key.Item3)));

    /// <summary>The stakes for a plan; the share is what is staked on the target rather than the edge against a defect.</summary>
    public static RateStakes Of(RatePlan plan, double targetShare = 0.5) => new(plan, targetShare);
}
