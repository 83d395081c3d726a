using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// The one value of a field of the file at hand, where nothing else in its type can have written to it.
/// </summary>
static class FieldReader
{
    public static IOperation? Initial(IFieldReferenceOperation reference)
    {
        IFieldSymbol field = reference.Field;
        if (!field.IsReadOnly && field.DeclaredAccessibility != Accessibility.Private)
            return null;
        if (reference.SemanticModel is not { } model
            || Declaration(field, model.SyntaxTree) is not { Initializer.Value: { } value } declaration)
            return null;
        // A second part of the type may lie in another file, where a constructor may write.
        if (field.ContainingType.DeclaringSyntaxReferences.Length != 1 || IsWritten(field, declaration))
            return null;
        return model.GetOperation(value);
    }

    public static VariableDeclaratorSyntax? Declaration(IFieldSymbol field, SyntaxTree tree) =>
        field.DeclaringSyntaxReferences.FirstOrDefault(
            reference => reference.SyntaxTree == tree)?.GetSyntax() as VariableDeclaratorSyntax;

    /// <summary>
    /// Every expression of the type that is assigned to a field of this name; by name, so rather one too many.
    /// </summary>
    public static IEnumerable<AssignmentExpressionSyntax> Assignments(IFieldSymbol field, SyntaxNode declaration) =>
        TypeAround(declaration).DescendantNodes().OfType<AssignmentExpressionSyntax>()
            .Where(assignment => NameOf(assignment.Left) == field.Name);

    static bool IsWritten(IFieldSymbol field, SyntaxNode declaration) =>
        TypeAround(declaration).DescendantNodes().Any(node => node switch
        {
            AssignmentExpressionSyntax assignment => assignment.Left.DescendantNodesAndSelf()
                .Any(part => NameOf(part) == field.Name),
            PrefixUnaryExpressionSyntax step when step.OperatorToken.Kind() is SyntaxKind.PlusPlusToken or SyntaxKind.MinusMinusToken =>
                NameOf(step.Operand) == field.Name,
            PostfixUnaryExpressionSyntax step => NameOf(step.Operand) == field.Name,
            ArgumentSyntax { RefKindKeyword.RawKind: not 0 } argument => NameOf(argument.Expression) == field.Name,
            RefExpressionSyntax byReference => NameOf(byReference.Expression) == field.Name,
            _ => false,
        });

    static SyntaxNode TypeAround(SyntaxNode node) => node.FirstAncestorOrSelf<TypeDeclarationSyntax>() ?? node;

    static string? NameOf(SyntaxNode node) => node switch
    {
        IdentifierNameSyntax name => name.Identifier.ValueText,
        MemberAccessExpressionSyntax access => access.Name.Identifier.ValueText,
        _ => null,
    };
}
