using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// Reads changed code again: a fix is offered only when the same place is then read, with the same rate, and is
/// silent.
/// </summary>
static class Rereading
{
    public static async Task<bool> Removes(
        Diagnostic diagnostic, Document before, Document after, CancellationToken cancellation)
    {
        if (await Reads(before, cancellation).ConfigureAwait(false) is not { } old
            || await Reads(after, cancellation).ConfigureAwait(false) is not { } now
            || old.Count != now.Count)
            return false;
        int at = old.FindIndex(reading => reading.Location.SourceSpan == diagnostic.Location.SourceSpan);
        if (at < 0 || !IsSameQuestion(old[at], now[at]) || TrialsOf(now[at]) != FixNumbers.TrialsOf(diagnostic))
            return false;
        var tree = await after.GetSyntaxTreeAsync(cancellation).ConfigureAwait(false);
        var limits = Limits.From(before.Project.AnalyzerOptions.AnalyzerConfigOptionsProvider.GetOptions(tree!));
        return RandomizedTests.Rules.All(
            rule => rule.Descriptor.Id != diagnostic.Id || rule.Judge(now[at], limits) is null);
    }

    // Raising a loop's bound alone would ask for another rate: that is another test, not this one with more trials.
    static bool IsSameQuestion(Reading old, Reading now) => (old, now) switch
    {
        (AssertionReading a, AssertionReading b) => a.Statistic == b.Statistic && IsSame(a.Target, b.Target)
            && IsSame(a.Meant.Low, b.Meant.Low) && IsSame(a.Meant.High, b.Meant.High),
        (ClaimReading a, ClaimReading b) => a.Needed == b.Needed,
        _ => false,
    };

    static long? TrialsOf(Reading reading) => (reading as AssertionReading)?.Trials
        ?? (reading as ClaimReading)?.Trials;

    static bool IsSame(double? a, double? b) => a is null == b is null && Math.Abs((a ?? 0) - (b ?? 0)) < 1e-9;

    static async Task<List<Reading>?> Reads(Document document, CancellationToken cancellation)
    {
        if (await document.GetSemanticModelAsync(cancellation).ConfigureAwait(false) is not { } model)
            return null;
        var readings = new List<Reading>();
        if (SuiteReader.For(model.Compilation) is { } suite)
            readings.AddRange(suite.Read(model, cancellation));
        SyntaxNode root = await model.SyntaxTree.GetRootAsync(cancellation).ConfigureAwait(false);
        if (ClaimReader.For(model.Compilation) is { } claims)
            readings.AddRange(
                root.DescendantNodes().OfType<InvocationExpressionSyntax>().SelectMany(
                call => Of(call, claims, model, cancellation)));
        return readings;
    }

    static ImmutableArray<ClaimReading> Of(
        InvocationExpressionSyntax call, ClaimReader claims, SemanticModel model, CancellationToken cancellation) =>
        call.Expression is MemberAccessExpressionSyntax { Name.Identifier.ValueText: "Rate" or "RateAtLeast" or "RateAtMost" }
        && model.GetOperation(call, cancellation) is IInvocationOperation made && claims.Makes(made)
        && claims.Read(made, cancellation) is { } reading
            ? [reading]
            : [];
}
