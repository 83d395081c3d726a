using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// The literal behind a number: itself, or what a constant or never reassigned local of the same file is initialised
/// with.
/// </summary>
static class LiteralReader
{
    public static Location? Of(IOperation number) => number.Unwrapped() switch
    {
        ILiteralOperation { Syntax: LiteralExpressionSyntax literal } => literal.GetLocation(),
        ILocalReferenceOperation local => Initializer(local.Local, number.Syntax.SyntaxTree),
        IFieldReferenceOperation { Field: { } field } when field.IsConst || field.IsReadOnly =>
            Initializer(field, number.Syntax.SyntaxTree),
        _ => null,
    };

    static Location? Initializer(ISymbol symbol, SyntaxTree tree) =>
        symbol.DeclaringSyntaxReferences.FirstOrDefault(reference => reference.SyntaxTree == tree)?.GetSyntax()
            is VariableDeclaratorSyntax { Initializer.Value: LiteralExpressionSyntax literal }
            ? literal.GetLocation()
            : null;
}
