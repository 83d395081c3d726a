using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// One test framework: which methods are tests, and what its assertions demand. One file a framework, found by
/// reflection.
/// </summary>
abstract class TestFramework
{
    /// <summary>What reports call it.</summary>
    public abstract string Name { get; }

    /// <summary>A type without which the framework is not there.</summary>
    public abstract string AssertionType { get; }

    /// <summary>
    /// The attributes that make a method a test, by name and namespace; classes derived from them count.
    /// </summary>
    public abstract bool IsTestAttribute(INamedTypeSymbol attribute);

    /// <summary>What a call demands; null when it is no assertion that is followed.</summary>
    public abstract Requirement? Read(IInvocationOperation call, Evaluator evaluator);

    /// <summary>Whether a call fails the test unconditionally.</summary>
    public abstract bool IsFailure(IMethodSymbol method);

    /// <summary>Whether a method belongs to the framework's assertions.</summary>
    public abstract bool IsAssertion(IMethodSymbol method);

    /// <summary>The constants of one data row; null for any other attribute.</summary>
    public abstract DataRow? Row(AttributeData attribute);

    /// <summary>
    /// How often the framework runs the test and judges by all or the best run; null when that is not known.
    /// </summary>
    public virtual Runs? RunsOf(AttributeData attribute) =>
        attribute.AttributeClass?.Name is { } name && (Has(name, "Retry") || Has(name, "Repeat") || Has(name, "Flaky"))
            ? null : Runs.Once;

    protected static bool Has(string text, string word) => text.IndexOf(word, StringComparison.OrdinalIgnoreCase) >= 0;

    // Asked of every call of a suite: no name is put together.
    protected static bool IsIn(INamedTypeSymbol type, string space)
    {
        int end = space.Length;
        for (INamespaceSymbol? at = type.ContainingNamespace; at is { IsGlobalNamespace: false }; at = at.ContainingNamespace)
        {
            int start = end - at.Name.Length;
            if (start < 0 || string.CompareOrdinal(space, start, at.Name, 0, at.Name.Length) != 0)
                return false;
            if (start == 0)
                return at.ContainingNamespace is { IsGlobalNamespace: true };
            if (space[start - 1] != '.')
                return false;
            end = start - 1;
        }

        return false;
    }

    protected static Requirement Demand(Term condition, IOperation site, Term? meant = null) =>
        new(condition, meant, site, 1, false);

    /// <summary>|expected − actual| ≤ tolerance, in the order in which the frameworks subtract.</summary>
    protected static Term Within(NumberKind kind, Term expected, Term actual, Term tolerance) => Term.Of(
        Operator.LessOrEqual, kind,
            Term.Of(Operator.Absolute, kind, Term.Of(Operator.Subtract, kind, expected, actual)), tolerance);
}
