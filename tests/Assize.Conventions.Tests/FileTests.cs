using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace Assize.Conventions.Tests;

/// <summary>File = type, everywhere.</summary>
public class FileTests
{
    [Fact]
    public void A_file_holds_the_type_it_is_named_after()
    {
        var sources = Sources.Below("src", "analyzers", "tests", "samples");
        var misnamed = sources.Where(file => !IsNamedAfterItsType(file)).Select(file => Path.GetRelativePath(Testing.Repository.Root, file));

        Assert.Empty(misnamed);
        Assert.True(sources.Count > 40, $"only {sources.Count} files seen");
    }

    // A second type may stand in the file only as a part of something larger: the factory of a law or of a claim.
    static bool IsNamedAfterItsType(string file)
    {
        // Claim{TDraw}.cs holds the generic Claim.
        string name = Path.GetFileNameWithoutExtension(file).Split('{')[0];
        var root = CSharpSyntaxTree.ParseText(File.ReadAllText(file)).GetCompilationUnitRoot();
        var types = root.DescendantNodes(node => node is CompilationUnitSyntax or BaseNamespaceDeclarationSyntax)
            .OfType<MemberDeclarationSyntax>()
            .Where(member => member is BaseTypeDeclarationSyntax or DelegateDeclarationSyntax)
            .ToArray();
        if (types.Length == 0)
            return root.Members.Any(member => member is GlobalStatementSyntax) || root.AttributeLists.Count > 0;

        return types.Any(type => Name(type) == name)
            && types.All(type => Name(type) == name || type.Modifiers.Any(modifier => modifier.IsKind(SyntaxKind.PartialKeyword) || modifier.IsKind(SyntaxKind.FileKeyword)));
    }

    static string Name(MemberDeclarationSyntax member) => member switch
    {
        BaseTypeDeclarationSyntax type => type.Identifier.Text,
        DelegateDeclarationSyntax type => type.Identifier.Text,
        _ => "",
    };
}
