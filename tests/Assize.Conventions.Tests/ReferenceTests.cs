using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace Assize.Conventions.Tests;

/// <summary>Who may know whom: read from the built assemblies, not from the project files.</summary>
public class ReferenceTests
{
    [Theory]
    [InlineData("Assize.Bounds")]
    [InlineData("Assize", "Assize.Bounds", "MathNet.Numerics")]
    [InlineData("Assize.Cli", "Assize", "Assize.Bounds", "Assize.Analyzers", "System.CommandLine", "Spectre.Console",
        "Spectre.Console.Ansi", "Basic.Reference.Assemblies.Net100", "Microsoft.CodeAnalysis", "Microsoft.CodeAnalysis.CSharp",
        "Microsoft.CodeAnalysis.Workspaces", "Microsoft.CodeAnalysis.Workspaces.MSBuild")]
    [InlineData("Assize.Analyzers", "Assize.Bounds", "Microsoft.CodeAnalysis", "Microsoft.CodeAnalysis.CSharp")]
    [InlineData("Assize.Analyzers.Fixes", "Assize.Analyzers", "Assize.Bounds", "Microsoft.CodeAnalysis",
        "Microsoft.CodeAnalysis.CSharp", "Microsoft.CodeAnalysis.Workspaces", "Microsoft.CodeAnalysis.CSharp.Workspaces")]
    public void Assemblies_reference_only_what_the_architecture_allows(string assembly, params string[] allowed)
    {
        string[] references = References(assembly);

        Assert.NotEmpty(references);
        Assert.Empty(references.Where(name => !IsOfThePlatform(name)).Except(allowed));
    }

    [Fact]
    public void The_numeric_core_references_nothing_but_the_standard() =>
        Assert.Equal(["netstandard"], References("Assize.Bounds"));

    static bool IsOfThePlatform(string name) =>
        name is "netstandard" or "mscorlib" || (name.StartsWith("System.", StringComparison.Ordinal) && name != "System.CommandLine");

    static string[] References(string assembly)
    {
        using var file = File.OpenRead(Path.Combine(AppContext.BaseDirectory, assembly + ".dll"));
        using var image = new PEReader(file);
        var metadata = image.GetMetadataReader();
        return [.. metadata.AssemblyReferences.Select(handle => metadata.GetString(metadata.GetAssemblyReference(handle).Name))];
    }
}
