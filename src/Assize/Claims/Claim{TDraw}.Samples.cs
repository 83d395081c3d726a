using System.Diagnostics;
using System.Runtime.CompilerServices;
using Assize.Bounds;

namespace Assize;

public abstract partial record Claim<TDraw>
{
    /// <summary>Judges draws that exist already, in their order; a refuted claim fails the test.</summary>
    /// <param name="sample">Draws of independent trials. Those after the verdict are not looked at.</param>
    /// <param name="sampleText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <exception cref="ClaimRefutedException">The claim is refuted; under NUnit its own failure.</exception>
    /// <exception cref="ClaimRefusedException">The sample ends before the claim is decided, or the numbers of the claim
    /// cannot be met.</exception>
    [StackTraceHidden]
    public void MustHoldFor(
        ReadOnlySpan<TDraw> sample,
        [CallerArgumentExpression(nameof(sample))] string sampleText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        JudgeFor(sample, sampleText, member, file, line).MustBeUpheld();

    /// <inheritdoc cref="MustHoldFor(ReadOnlySpan{TDraw}, string, string, string, int)"/>
    [StackTraceHidden]
    public void MustHoldFor(
        IEnumerable<TDraw> sample,
        [CallerArgumentExpression(nameof(sample))] string sampleText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        JudgeFor(sample, sampleText, member, file, line).MustBeUpheld();

    /// <inheritdoc cref="MustHoldFor(ReadOnlySpan{TDraw}, string, string, string, int)"/>
    /// <returns>A task that ends with the verdict.</returns>
    [StackTraceHidden]
    public async Task MustHoldForAsync(
        IAsyncEnumerable<TDraw> sample,
        [CallerArgumentExpression(nameof(sample))] string sampleText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        (await JudgeForAsync(sample, sampleText, member, file, line).ConfigureAwait(false)).MustBeUpheld();

    /// <summary>Judges draws that exist already and hands back the verdict; the test framework is not touched.</summary>
    /// <param name="sample">Draws of independent trials. Those after the verdict are not looked at.</param>
    /// <param name="sampleText">Filled in by the compiler.</param>
    /// <param name="member">Filled in by the compiler.</param>
    /// <param name="file">Filled in by the compiler.</param>
    /// <param name="line">Filled in by the compiler.</param>
    /// <returns>The verdict.</returns>
    /// <exception cref="ClaimRefusedException">The sample ends before the claim is decided, or the numbers of the claim
    /// cannot be met.</exception>
    public Verdict JudgeFor(
        ReadOnlySpan<TDraw> sample,
        [CallerArgumentExpression(nameof(sample))] string sampleText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0) =>
        Hearing.Of(this, new(sampleText, member, file, line, Replay.Sample)).RunFor(Start(), sample);

    /// <inheritdoc cref="JudgeFor(ReadOnlySpan{TDraw}, string, string, string, int)"/>
    public Verdict JudgeFor(
        IEnumerable<TDraw> sample,
        [CallerArgumentExpression(nameof(sample))] string sampleText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(sample);
        return Hearing.Of(this, new(sampleText, member, file, line, Replay.Sample)).RunFor(Start(), sample);
    }

    /// <inheritdoc cref="JudgeFor(ReadOnlySpan{TDraw}, string, string, string, int)"/>
    public Task<Verdict> JudgeForAsync(
        IAsyncEnumerable<TDraw> sample,
        [CallerArgumentExpression(nameof(sample))] string sampleText = "",
        [CallerMemberName] string member = "", [CallerFilePath] string file = "", [CallerLineNumber] int line = 0)
    {
        ArgumentNullException.ThrowIfNull(sample);
        return Hearing.Of(this, new(sampleText, member, file, line, Replay.Sample)).RunForAsync(Start(), sample);
    }
}
