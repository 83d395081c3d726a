using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace Assize.Analyzers;

/// <summary>The constants a parameterised test is run with.</summary>
sealed record DataRow(ImmutableArray<TypedConstant> Values)
{
    public const int MostRows = 64;

    /// <summary>The row of an attribute whose arguments are the values, directly or as one params array.</summary>
    public static DataRow Of(AttributeData attribute)
    {
        var arguments = attribute.ConstructorArguments;
        return new DataRow(
            arguments is { Length: 1 } && arguments[0].Kind == TypedConstantKind.Array && !arguments[0].IsNull
            ? arguments[0].Values
            : arguments);
    }

    /// <summary>What the row says of the parameters, converted as the framework converts.</summary>
    public ImmutableDictionary<ISymbol, Term> Bind(IMethodSymbol method)
    {
        var row = ImmutableDictionary.CreateBuilder<ISymbol, Term>(SymbolEqualityComparer.Default);
        foreach (IParameterSymbol parameter in method.Parameters.Take(Values.Length))
        {
            TypedConstant value = Values[parameter.Ordinal];
            if (value.Kind == TypedConstantKind.Primitive && value.Value is { } constant
                && (Arithmetic.Convert(Arithmetic.KindOf(parameter.Type), constant) ?? constant as string) is { } known)
                row[parameter] = new Term.Known(known);
        }

        return row.ToImmutable();
    }

    public override string ToString() => $"({string.Join(", ", Values.Select(Text))})";

    static string Text(TypedConstant value) => value.Kind == TypedConstantKind.Error ? "?" : value.ToCSharpString();
}
