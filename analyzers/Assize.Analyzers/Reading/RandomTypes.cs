using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>The framework's generators, looked up once a compilation.</summary>
sealed class RandomTypes
{
    readonly INamedTypeSymbol? _random;
    readonly INamedTypeSymbol? _cryptographic;

    public RandomTypes(Compilation compilation)
    {
        _random = compilation.GetTypeByMetadataName("System.Random");
        _cryptographic = compilation.GetTypeByMetadataName("System.Security.Cryptography.RandomNumberGenerator");
    }

    public bool IsRandom(ITypeSymbol? type) => Is(type, _random);

    public bool IsCryptographic(ITypeSymbol? type) => Is(type, _cryptographic);

    /// <summary>Whether the type is a generator or derives from one.</summary>
    public bool IsGenerator(ITypeSymbol? type)
    {
        for (ITypeSymbol? at = type; at is not null; at = at.BaseType)
        {
            if (IsRandom(at) || IsCryptographic(at))
                return true;
        }

        return false;
    }

    public bool IsShared(IPropertySymbol property) => property is { IsStatic: true, Name: "Shared" }
        && IsRandom(property.ContainingType);

    /// <summary>
    /// Whether a type belongs to the platform, a test framework or a library of stubs: never the code under test.
    /// </summary>
    public static bool IsFramework(ITypeSymbol type)
    {
        INamespaceSymbol? space = type.ContainingNamespace;
        while (space is { IsGlobalNamespace: false, ContainingNamespace.IsGlobalNamespace: false })
            space = space.ContainingNamespace;
        return space?.Name is "System" or "Microsoft" or "Xunit" or "NUnit" or "Moq" or "NSubstitute" or "FakeItEasy";
    }

    static bool Is(ITypeSymbol? type, ITypeSymbol? known) => known is not null
        && SymbolEqualityComparer.Default.Equals(type, known);
}
