using System.Diagnostics;
using System.Runtime.CompilerServices;
using Assize.Bounds;

namespace Assize;

public abstract partial record Claim<TDraw>
{
    /// <summary>Runs trials in batches until the claim is upheld or refuted; a refuted claim fails the test.</summary>
    /// <param name="batch">Trials in a batch, at least 1. A batch is brought back whole: another size gives other draws.</param>
    /// <param name="fill">Fills a batch with the draws of independent trials.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met, or the batch is empty.</exception>
    /// <exception cref="TrialFailedException">A batch threw before the claim was decided; it is counted in batches.</exception>
    [StackTraceHidden]
    public void MustHold(
        int batch, FillDraws<TDraw> fill,
        [CallerArgumentExpression(nameof(fill))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        Judge(batch, fill, trialText, member, file, line).MustBeUpheld();

    /// <summary>Runs trials in batches and hands back the verdict; the test framework is not touched.</summary>
    /// <param name="batch">Trials in a batch, at least 1. A batch is brought back whole: another size gives other draws.</param>
    /// <param name="fill">Fills a batch with the draws of independent trials.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met, or the batch is empty.</exception>
    /// <exception cref="TrialFailedException">A batch threw before the claim was decided; it is counted in batches.</exception>
    public Verdict Judge(
        int batch, FillDraws<TDraw> fill,
        [CallerArgumentExpression(nameof(fill))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(fill);
        if (batch < 1)
            throw new ClaimRefusedException($"A batch holds 1 trial or more; it is {batch}.");

        return Hearing.Of(this, new(trialText, member, file, line, Replay.Batch)).Run(
            () => new BatchRace<TDraw>(Start(), batch),
            random =>
            {
                var draws = new TDraw[batch];
                fill(random, draws);
                return draws;
            });
    }
}
