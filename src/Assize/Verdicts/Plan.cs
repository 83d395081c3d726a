using System.Collections.Immutable;
using Assize.Bounds;

namespace Assize;

/// <summary>What a claim costs, computed before the first trial.</summary>
public sealed record Plan
{
    readonly Lazy<ExpectedTrials?> _expected;
    readonly Lazy<IReadOnlyList<TheoremTrials>> _theorems;

    internal Plan(Func<ExpectedTrials?> expected, Func<IReadOnlyList<TheoremTrials>> theorems) =>
        (_expected, _theorems) = (new(expected), new(theorems));

    internal static Plan Of(RateStakes stakes) =>
        new(() => ExpectedTrials.Of(stakes), () => stakes.Plan.Theorems)
        {
            FixedTrials = stakes.Plan.Trials,
            FirstTrials = stakes.Plan.FirstTrials,
            Limits = stakes.Plan.Limits,
            TrialCap = stakes.Trials,
            Theorem = stakes.Plan.Theorem,
        };

    /// <summary>Trials under the fixed plan: this number, and every larger one, keeps risk and confidence.</summary>
    public long FixedTrials { get; internal init; }

    /// <summary>The first number of trials that keeps risk and confidence; some larger ones may not.</summary>
    public long FirstTrials { get; internal init; }

    /// <summary>The counts of successes that the fixed plan accepts at <see cref="FixedTrials"/>, with both error
    /// probabilities; null when the claim is not judged by one count.</summary>
    public RateLimits? Limits { get; internal init; }

    /// <summary>Where the race ends at the latest.</summary>
    public long TrialCap { get; internal init; }

    /// <summary>About how many trials the race takes; null when that depends on more than the claim says. No verdict
    /// rests on it.</summary>
    public ExpectedTrials? Expected => _expected.Value;

    /// <summary>The theorem that decided the fixed plan.</summary>
    public string Theorem { get; internal init; } = "";

    /// <summary>Every theorem that applies, with the trials it would need alone, fewest first.</summary>
    public ImmutableArray<TheoremTrials> Alternatives => [.. _theorems.Value];

    /// <summary>The plan in one sentence.</summary>
    /// <returns>The trials of the race and of the fixed plan.</returns>
    public override string ToString() =>
        (Expected is { } expected ? $"about {Wording.Number((long)Math.Ceiling(expected.AtTarget))} trials when right, " : "")
        + $"{Wording.Number(TrialCap)} at most; fixed beforehand, {Wording.Number(FixedTrials)} ({Theorem})";
}
