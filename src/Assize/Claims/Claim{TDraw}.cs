using System.Diagnostics;
using System.Runtime.CompilerServices;
using Assize.Bounds;

namespace Assize;

/// <summary>A claim about draws of one type: the verbs exist once, here, for every family.</summary>
/// <typeparam name="TDraw">What one trial yields.</typeparam>
public abstract partial record Claim<TDraw> : Claim
{
    private protected Claim()
    {
    }

    /// <summary>The race that judges this claim, before its first trial.</summary>
    private protected abstract IRace<TDraw> Start();

    /// <summary>Runs trials until the claim is upheld or refuted; a refuted claim fails the test.</summary>
    /// <param name="trial">One independent run of the code under test, drawing from the generator it is given and from nothing else.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    [StackTraceHidden]
    public void MustHold(
        Func<Random, TDraw> trial,
        [CallerArgumentExpression(nameof(trial))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        Judge(trial, trialText, member, file, line).MustBeUpheld();

    /// <summary>The same for a source that takes no generator: judged alike, but the run cannot be replayed.</summary>
    /// <param name="source">One independent run of the code under test.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    [StackTraceHidden]
    public void MustHold(
        Func<TDraw> source,
        [CallerArgumentExpression(nameof(source))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        Judge(source, trialText, member, file, line).MustBeUpheld();

    /// <summary>Runs asynchronous trials until the claim is upheld or refuted; a refuted claim fails the test.</summary>
    /// <param name="trial">One independent run of the code under test, drawing from the generator it is given and from nothing else.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>A task that ends with the verdict.</returns>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    [StackTraceHidden]
    public async Task MustHoldAsync(
        Func<Random, Task<TDraw>> trial,
        [CallerArgumentExpression(nameof(trial))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        (await JudgeAsync(trial, trialText, member, file, line).ConfigureAwait(false)).MustBeUpheld();

    /// <summary>The same for an asynchronous source that takes no generator: judged alike, but the run cannot be replayed.</summary>
    /// <param name="source">One independent run of the code under test.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>A task that ends with the verdict.</returns>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    [StackTraceHidden]
    public async Task MustHoldAsync(
        Func<Task<TDraw>> source,
        [CallerArgumentExpression(nameof(source))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        (await JudgeAsync(source, trialText, member, file, line).ConfigureAwait(false)).MustBeUpheld();

    /// <summary>Runs trials until the claim is upheld or refuted and hands back the verdict; the test framework is not touched.</summary>
    /// <param name="trial">One independent run of the code under test, drawing from the generator it is given and from nothing else.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    public Verdict Judge(
        Func<Random, TDraw> trial,
        [CallerArgumentExpression(nameof(trial))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(trial);
        return Hearing.Of(this, new(trialText, member, file, line, Replay.Trial)).Run(Start, trial);
    }

    /// <summary>The same for a source that takes no generator: the verdict says that it cannot be replayed.</summary>
    /// <param name="source">One independent run of the code under test.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    public Verdict Judge(
        Func<TDraw> source,
        [CallerArgumentExpression(nameof(source))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(source);
        return Hearing.Of(this, new(trialText, member, file, line, Replay.None)).Run(Start, _ => source());
    }

    /// <summary>Runs asynchronous trials until the claim is upheld or refuted and hands back the verdict.</summary>
    /// <param name="trial">One independent run of the code under test, drawing from the generator it is given and from nothing else.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    public Task<Verdict> JudgeAsync(
        Func<Random, Task<TDraw>> trial,
        [CallerArgumentExpression(nameof(trial))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(trial);
        return Hearing.Of(this, new(trialText, member, file, line, Replay.Trial)).RunAsync(Start, trial);
    }

    /// <summary>The same for an asynchronous source that takes no generator: the verdict says that it cannot be replayed.</summary>
    /// <param name="source">One independent run of the code under test.</param>
    /// <param name="trialText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    public Task<Verdict> JudgeAsync(
        Func<Task<TDraw>> source,
        [CallerArgumentExpression(nameof(source))] string trialText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(source);
        return Hearing.Of(this, new(trialText, member, file, line, Replay.None)).RunAsync(Start, _ => source());
    }
}
