using System.Collections.Immutable;
using System.Reflection;
using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>
/// The test frameworks of a compilation and the facts about a test method. Null without any framework.
/// </summary>
sealed class TestMethods
{
    static readonly ImmutableArray<TestFramework> All =
    [
        .. typeof(TestFramework).GetTypeInfo().Assembly.DefinedTypes
            .Where(type => !type.IsAbstract && typeof(TestFramework).GetTypeInfo().IsAssignableFrom(type))
            .Select(type => (TestFramework)Activator.CreateInstance(type.AsType())!),
    ];

    readonly ImmutableArray<TestFramework> _present;

    TestMethods(ImmutableArray<TestFramework> present) => _present = present;

    public static TestMethods? In(Compilation compilation)
    {
        ImmutableArray<TestFramework> present =
            [.. All.Where(framework => !compilation.GetTypesByMetadataName(framework.AssertionType).IsEmpty)];
        return present.IsEmpty ? null : new TestMethods(present);
    }

    /// <summary>The framework whose attribute makes the method a test; null for any other method.</summary>
    public TestFramework? FrameworkOf(IMethodSymbol method)
    {
        foreach (AttributeData attribute in method.GetAttributes())
        {
            for (INamedTypeSymbol? type = attribute.AttributeClass; type is not null; type = type.BaseType)
            {
                foreach (TestFramework framework in _present)
                {
                    if (framework.IsTestAttribute(type))
                        return framework;
                }
            }
        }

        return null;
    }

    /// <summary>
    /// How often the framework runs the method; null when an attribute says something that is not followed.
    /// </summary>
    public static Runs? RunsOf(IMethodSymbol method, TestFramework framework)
    {
        Runs runs = Runs.Once;
        foreach (AttributeData attribute in method.GetAttributes().Concat(method.ContainingType.GetAttributes()))
        {
            if (framework.RunsOf(attribute) is not { } once)
                return null;
            runs = new Runs(runs.Repeats * once.Repeats, runs.Tries * once.Tries);
        }

        // Retried repeats are run in an order of their own by each framework.
        return runs is { Repeats: > 1, Tries: > 1 } ? null : runs;
    }

    public static ImmutableArray<DataRow> RowsOf(IMethodSymbol method, TestFramework framework) =>
        [.. method.GetAttributes().Select(framework.Row).OfType<DataRow>().Take(DataRow.MostRows)];
}
