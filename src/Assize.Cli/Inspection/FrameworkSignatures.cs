using Basic.Reference.Assemblies;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace Assize.Cli;

/// <summary>What plain sources are bound against: the platform, signatures of the test frameworks, and the kit itself.</summary>
static class FrameworkSignatures
{
    static readonly Lazy<IReadOnlyList<MetadataReference>> Once = new(
        () => [.. Net100.References.All, .. Names().Select(Compiled), Kit(typeof(Claim)), Kit(typeof(Bounds.Enclosure))]);

    public static IReadOnlyList<MetadataReference> References => Once.Value;

    /// <summary>The frameworks and assertion styles there are signatures of.</summary>
    public static IEnumerable<string> Names() => typeof(FrameworkSignatures).Assembly.GetManifestResourceNames()
        .Where(name => name.StartsWith("Stubs/", StringComparison.Ordinal))
        .Select(name => name["Stubs/".Length..])
        .Order(StringComparer.Ordinal);

    /// <summary>The signatures of one, as a compilation that must be free of errors.</summary>
    public static CSharpCompilation Compilation(string name)
    {
        using var text = new StreamReader(typeof(FrameworkSignatures).Assembly.GetManifestResourceStream("Stubs/" + name)!);
        return CSharpCompilation.Create(
            "Signatures." + name,
            [CSharpSyntaxTree.ParseText(text.ReadToEnd())],
            Net100.References.All,
            new CSharpCompilationOptions(OutputKind.DynamicallyLinkedLibrary));
    }

    static MetadataReference Compiled(string name) => Compilation(name).ToMetadataReference();

    static PortableExecutableReference Kit(Type type) => MetadataReference.CreateFromFile(type.Assembly.Location);
}
