using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace Assize.Analyzers;

/// <summary>
/// What the source of a method or type gives away without being bound. Code without source gives nothing away.
/// </summary>
/// <param name="IsVisible">Whether there is source at all.</param>
/// <param name="MentionsGenerator">Whether a generator is named anywhere in it.</param>
/// <param name="SeedsGenerator">Whether a generator is made with a seed in it, or may be.</param>
sealed record SourceScan(bool IsVisible, bool MentionsGenerator, bool SeedsGenerator)
{
    const int MostBases = 8;

    static readonly HashSet<string> Generators =
        ["Random", "RandomNumberGenerator", "NextDouble", "NextSingle", "NewGuid"];

    /// <summary>Of a method, with the type that it works on.</summary>
    public static SourceScan Of(IMethodSymbol method) =>
        Of(method.OriginalDefinition.DeclaringSyntaxReferences).With(Of(method.ContainingType));

    /// <summary>Of a type, with its bases.</summary>
    public static SourceScan Of(ITypeSymbol type)
    {
        var scan = new SourceScan(false, false, false);
        ITypeSymbol? at = type;
        for (int depth = 0; at is not null && depth < MostBases; depth++, at = at.BaseType)
            scan = scan.With(Of(at.OriginalDefinition.DeclaringSyntaxReferences));
        return scan;
    }

    static SourceScan Of(IEnumerable<SyntaxReference> references)
    {
        var scan = new SourceScan(false, false, false);
        foreach (SyntaxReference reference in references)
        {
            var nodes = reference.GetSyntax().DescendantNodes().ToList();
            bool mentions = nodes.OfType<SimpleNameSyntax>().Any(
                name => Generators.Contains(name.Identifier.ValueText));
            bool seeds = nodes.OfType<BaseObjectCreationExpressionSyntax>().Any(created => Seeds(created, mentions))
                || nodes.OfType<ConstructorInitializerSyntax>().Any(
                    initializer => initializer.ArgumentList.Arguments.Count > 0);
            scan = scan.With(new SourceScan(true, mentions, seeds));
        }

        return scan;
    }

    SourceScan With(SourceScan other) => new(
        IsVisible || other.IsVisible, MentionsGenerator || other.MentionsGenerator, SeedsGenerator
            || other.SeedsGenerator);

    static bool Seeds(BaseObjectCreationExpressionSyntax created, bool mentions) =>
        created.ArgumentList is { Arguments.Count: > 0 }
        && created switch
        {
            ObjectCreationExpressionSyntax named => named.Type.ToString().EndsWith("Random", StringComparison.Ordinal),
            _ => mentions,
        };
}
