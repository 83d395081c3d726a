using System.Collections.Immutable;
using Assize.Bounds;

namespace Assize;

/// <summary>What a claim costs, computed before the first trial.</summary>
public sealed record Plan
{
    readonly RatePlan _plan;
    readonly Lazy<ExpectedTrials> _expected;

    internal Plan(RateStakes stakes)
    {
        _plan = stakes.Plan;
        TrialCap = stakes.Trials;
        _expected = new(() => ExpectedTrials.Of(stakes));
    }

    /// <summary>Trials under the fixed plan: this number, and every larger one, keeps risk and confidence.</summary>
    public long FixedTrials => _plan.Trials;

    /// <summary>The first number of trials that keeps risk and confidence; some larger ones do not.</summary>
    public long FirstTrials => _plan.FirstTrials;

    /// <summary>What the fixed plan accepts at <see cref="FixedTrials"/>, with both error probabilities.</summary>
    public RateLimits Limits => _plan.Limits;

    /// <summary>Where the race ends at the latest.</summary>
    public long TrialCap { get; }

    /// <summary>About how many trials the race takes; no verdict rests on it.</summary>
    public ExpectedTrials Expected => _expected.Value;

    /// <summary>The theorem that decided the fixed plan.</summary>
    public string Theorem => _plan.Theorem;

    /// <summary>Every theorem that applies, with the trials it would need alone, fewest first.</summary>
    public ImmutableArray<TheoremTrials> Alternatives => [.. _plan.Theorems];

    /// <summary>The plan in one sentence.</summary>
    /// <returns>The trials of the race and of the fixed plan.</returns>
    public override string ToString() =>
        $"about {Wording.Number((long)Math.Ceiling(Expected.AtTarget))} trials when right, {Wording.Number(TrialCap)} at most; "
        + $"fixed beforehand, {Wording.Number(FixedTrials)} ({Theorem})";
}
