using System.Diagnostics;
using System.Runtime.CompilerServices;
using Assize.Bounds;

namespace Assize;

/// <summary>A claim about two sources: a trial draws once from each.</summary>
/// <typeparam name="TDraw">What each source yields.</typeparam>
public abstract record Comparison<TDraw> : Claim<(TDraw One, TDraw Other)>
{
    private protected Comparison()
    {
    }

    /// <summary>Whether the sources draw from streams of their own; else both draw the same numbers, so that what they have in
    /// common cancels.</summary>
    internal bool Apart { get; init; }

    /// <summary>Runs trials until the claim is upheld or refuted; a refuted claim fails the test.</summary>
    /// <param name="one">One independent run of the one source, drawing from the generator it is given and from nothing else.</param>
    /// <param name="other">The same of the other source.</param>
    /// <param name="oneText">Filled in by the compiler.</param>
    /// <param name="otherText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <exception cref="ClaimRefutedException">The claim is refuted, or stayed undecided at a cap; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    [StackTraceHidden]
    public void MustHold(
        Func<Random, TDraw> one, Func<Random, TDraw> other,
        [CallerArgumentExpression(nameof(one))] string oneText = "", [CallerArgumentExpression(nameof(other))] string otherText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        Judge(one, other, oneText, otherText, member, file, line).MustBeUpheld();

    /// <summary>Runs trials until the claim is upheld or refuted and hands back the verdict; the test framework is not touched.</summary>
    /// <param name="one">One independent run of the one source, drawing from the generator it is given and from nothing else.</param>
    /// <param name="other">The same of the other source.</param>
    /// <param name="oneText">Filled in by the compiler.</param>
    /// <param name="otherText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The numbers of the claim cannot be met.</exception>
    /// <exception cref="TrialFailedException">A trial threw before the claim was decided.</exception>
    public Verdict Judge(
        Func<Random, TDraw> one, Func<Random, TDraw> other,
        [CallerArgumentExpression(nameof(one))] string oneText = "", [CallerArgumentExpression(nameof(other))] string otherText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(one);
        ArgumentNullException.ThrowIfNull(other);
        bool apart = Apart;
        return Hearing.Of(this, new($"{oneText} against {otherText}", member, file, line, Replay.Trial))
            .Run(Start, random => (one(random), other(((TrialRandom)random).Twin(apart))));
    }
}
