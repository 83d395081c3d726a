using System.Diagnostics;
using System.Runtime.CompilerServices;
using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Many yes/no outputs of one trial all have the same rate, give or take a tolerance, at one risk for all.</summary>
    /// <param name="count">How many outputs a trial has, in [1, 1,000,000].</param>
    /// <param name="target">The rate claimed of each, in [0, 1].</param>
    /// <param name="tolerance">How far from the target is still right: a distance, 0 allowed.</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>A claim about the outputs of a trial, which may depend on one another.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static ManyRatesClaim ManyRates(int count, double target, double tolerance, double? defect = null) =>
        new(count, Edges.Around(Domain.Rate, target, tolerance, defect), tolerance, defect ?? 2 * tolerance);
}

/// <summary>A claim about many yes/no outputs of a trial, say every cell of a table.</summary>
public sealed record ManyRatesClaim : Claim<bool[]>
{
    const int Most = 1_000_000;

    readonly int _count;
    readonly double _tolerance;
    readonly double _defect;
    readonly ManyStakesMemory _stakes;

    internal ManyRatesClaim(int count, Edges edges, double tolerance, double defect)
    {
        if (count is < 1 or > Most)
            throw new ClaimRefusedException($"ManyRates is about 1 to {Wording.Number((long)Most)} outputs; it is {count}.");

        (_count, Edges, _tolerance, _defect) = (count, edges, tolerance, defect);
        _stakes = new([.. Enumerable.Repeat(edges, count)]);
    }

    /// <summary>The target, the edges and the defects of each output's rate.</summary>
    public Edges Edges { get; }

    internal override string Sentence => $"of each of {Wording.Number((long)_count)} outputs, {Wording.Rate(Edges, _tolerance)}";

    internal override Statement Statement => new("many rates", "rate", Edges.Target, _tolerance, _defect, Edges);

    /// <inheritdoc/>
    public override Plan Plan() => _stakes.For(Risk, Confidence).ToPlan();

    /// <summary>Runs trials until the claim is upheld or refuted; a refuted claim fails the test.</summary>
    /// <param name="trial">One independent run of the code under test: fills every output, drawing from the generator it is given and from nothing else.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    [StackTraceHidden]
    public void MustHold(
        OneTrial<bool> trial,
        [CallerArgumentExpression(nameof(trial))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        Judge(trial, trialText, member, file, line).MustBeUpheld();

    /// <summary>Runs trials until the claim is upheld or refuted and hands back the verdict; the test framework is not touched.</summary>
    /// <param name="trial">One independent run of the code under test: fills every output, drawing from the generator it is given and from nothing else.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    public Verdict Judge(
        OneTrial<bool> trial,
        [CallerArgumentExpression(nameof(trial))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(trial);
        int count = _count;
        return Hearing.Of(this, new(trialText, member, file, line, Replay.Trial)).Run(
            Start,
            random =>
            {
                bool[] outputs = new bool[count];
                trial(random, outputs);
                return outputs;
            });
    }

    private protected override IRace<bool[]> Start()
    {
        var stakes = _stakes.For(Risk, Confidence);
        return new ManyRatesRace(stakes, Terms.TrialCap, ExactTrials(() => stakes.Plan.Trials));
    }
}
