using Assize.Analyzers;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
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
        return Assertions(root, model, compilation, token).Concat(Claims(root, model, compilation, token));
    }

    static IEnumerable<(Reading, string)> Assertions(
        SyntaxNode root, SemanticModel model, Compilation compilation, CancellationToken token)
    {
        if (SuiteReader.For(compilation) is not { } suite)
            yield break;
        foreach (var test in root.DescendantNodes().OfType<MethodDeclarationSyntax>())
        {
            // Nothing is bound before the method is known to be a test with something to read in it.
            if (test is not { Body: { } body, AttributeLists.Count: > 0 }
                || model.GetDeclaredSymbol(test, token) is not { } method
                || suite.Admit(method, body) is not { } framework
                || model.GetOperation(test, token) is not IMethodBodyOperation { BlockBody: { } block })
                continue;
            foreach (var reading in suite.Read(method, framework, block, token))
                yield return (reading, framework.GetType().Name.Replace("Framework", "", StringComparison.Ordinal));
        }
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
