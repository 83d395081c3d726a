using Assize.Analyzers;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Cli;

/// <summary>Every reading of one tree: hand-written assertions and claims, with the framework of the test.</summary>
static class TestReadings
{
    public static bool CanRead(Compilation compilation) =>
        SuiteReader.For(compilation) is not null || ClaimReader.For(compilation) is not null;

    public static bool HasFramework(Compilation compilation) => SuiteReader.For(compilation) is not null;

    public static IEnumerable<(Reading Reading, string Framework)> Of(
        SyntaxTree tree, Compilation compilation, CancellationToken token)
    {
        var root = tree.GetRoot(token);
        var model = compilation.GetSemanticModel(tree);
        var assertions = SuiteReader.For(compilation)?.Read(model, token) ?? [];
        return assertions.Select(reading => ((Reading)reading, reading.Framework)).Concat(Claims(root, model, compilation, token));
    }

    static IEnumerable<(Reading, string)> Claims(
        SyntaxNode root, SemanticModel model, Compilation compilation, CancellationToken token)
    {
        if (ClaimReader.For(compilation) is not { } claims)
            yield break;
        foreach (var call in root.DescendantNodes().OfType<InvocationExpressionSyntax>())
        {
            if (call.Expression is MemberAccessExpressionSyntax { Name.Identifier.ValueText: "Rate" or "RateAtLeast" or "RateAtMost" }
                && model.GetOperation(call, token) is IInvocationOperation made && claims.Makes(made)
                && claims.Read(made, token) is { } reading)
                yield return (reading, "Assize");
        }
    }
}
