using System.Collections.Immutable;
using System.Composition;
using System.Globalization;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CodeActions;
using Microsoft.CodeAnalysis.CodeFixes;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace Assize.Analyzers;

/// <summary>
/// Raises the number of trials to what is needed, at the one literal it comes from; offered where that removes the
/// diagnostic.
/// </summary>
[ExportCodeFixProvider(LanguageNames.CSharp)]
[Shared]
public sealed class RaiseTrialsFix : CodeFixProvider
{
    /// <inheritdoc/>
    public override ImmutableArray<string> FixableDiagnosticIds { get; } =
        [TooFewTrials.Id, FlakyAssertion.Id, UnprovenAssertion.Id];

    /// <inheritdoc/>
    public override FixAllProvider GetFixAllProvider() => WellKnownFixAllProviders.BatchFixer;

    /// <inheritdoc/>
    public override async Task RegisterCodeFixesAsync(CodeFixContext context)
    {
        foreach (Diagnostic diagnostic in context.Diagnostics)
        {
            if (await Changed(context.Document, diagnostic, context.CancellationToken).ConfigureAwait(
                false) is not { } changed)
                continue;
            string title = $"Raise the trials to {Numbers.Count(FixNumbers.TrialsOf(diagnostic)!.Value)}";
            // One key for all: fix-all raises every number to its own need.
            context.RegisterCodeFix(
                CodeAction.Create(title, _ => Task.FromResult(changed), nameof(RaiseTrialsFix)), diagnostic);
        }
    }

    static async Task<Document?> Changed(Document document, Diagnostic diagnostic, CancellationToken cancellation)
    {
        if (FixNumbers.TrialsOf(diagnostic) is not { } trials
            || diagnostic.AdditionalLocations.Count == 0
            || await document.GetSyntaxRootAsync(cancellation).ConfigureAwait(false) is not { } root
            || Literal(root, diagnostic.AdditionalLocations[0]) is not { } literal
            || Raised(literal, trials) is not { } raised)
            return null;
        Document changed = document.WithSyntaxRoot(root.ReplaceNode(literal, raised));
        return await Rereading.Removes(diagnostic, document, changed, cancellation).ConfigureAwait(false) ? changed
            : null;
    }

    static LiteralExpressionSyntax? Literal(SyntaxNode root, Location at) =>
        root.FullSpan.Contains(at.SourceSpan)
            ? root.FindNode(at.SourceSpan, getInnermostNodeForTie: true) as LiteralExpressionSyntax
            : null;

    static LiteralExpressionSyntax? Raised(LiteralExpressionSyntax literal, long trials)
    {
        if (literal.Token.Value is int && trials > int.MaxValue)
            return null;
        string suffix = literal.Token.Text.EndsWith("L", StringComparison.OrdinalIgnoreCase) ? "L" : "";
        string text = Grouped(trials, literal.Token.Text.IndexOf('_') >= 0) + suffix;
        SyntaxToken token = literal.Token.Value is int
            ? SyntaxFactory.Literal(literal.Token.LeadingTrivia, text, (int)trials, literal.Token.TrailingTrivia)
            : SyntaxFactory.Literal(literal.Token.LeadingTrivia, text, trials, literal.Token.TrailingTrivia);
        return literal.WithToken(token);
    }

    // Digits stay grouped where they were.
    static string Grouped(long trials, bool grouped) => grouped
        ? trials.ToString("N0", CultureInfo.InvariantCulture).Replace(',', '_')
        : trials.ToString(CultureInfo.InvariantCulture);
}
