using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;

namespace Assize.Analyzers.Tests;

/// <summary>
/// Half-typed and broken code is met without an exception: every miniature, cut, thinned and shuffled.
/// </summary>
public class MutationTests(ITestOutputHelper output)
{
    const int Mutants = 2000;
    const int Seed = 20260711;

    [Fact]
    public async Task Broken_code_never_makes_the_analyzer_throw()
    {
        string folder = Repository.Path("tests", "Assize.Analyzers.Tests", "Miniatures");
        string product = File.ReadAllText(Path.Combine(folder, "product", "Products.cs.txt"));
        var sources = new[] { "xunit", "nunit" }.SelectMany(name => Directory.GetFiles(Path.Combine(folder, name)))
            .Order(StringComparer.Ordinal).Select(File.ReadAllText).ToList();
        var random = new Random(Seed);
        int read = 0;
        for (int mutant = 0; mutant < Mutants; mutant++)
        {
            string source = Mutated(sources[mutant % sources.Count], random);
            var compilation = Workbench.Compile(source, product);
            if (IsAdmitted(compilation))
                read++;
            await Workbench.Analyze(compilation);
        }

        output.WriteLine($"{Mutants} mutants of {sources.Count} files, {read} reach the reader");
        Assert.Equal(22, sources.Count);
        Assert.True(read >= Mutants * 6 / 10, $"only {read} reach the reader");
    }

    static bool IsAdmitted(CSharpCompilation compilation)
    {
        var suite = SuiteReader.For(compilation)!;
        var tree = compilation.SyntaxTrees.Single();
        var model = compilation.GetSemanticModel(tree);
        return tree.GetRoot(TestContext.Current.CancellationToken).DescendantNodes().OfType<MethodDeclarationSyntax>()
            .Any(method =>
            method.Body is { } body
                && model.GetDeclaredSymbol(method, TestContext.Current.CancellationToken) is { } symbol
                && suite.Admit(symbol, body) is not null);
    }

    static string Mutated(string source, Random random)
    {
        if (random.Next(4) == 0)
            return source[..random.Next(source.Length / 2, source.Length)];
        var tokens = Workbench.Compile(source).SyntaxTrees.Single().GetRoot(TestContext.Current.CancellationToken)
            .DescendantTokens().ToList();
        for (int change = random.Next(1, 6); change > 0; change--)
        {
            var token = tokens[random.Next(tokens.Count)];
            var other = tokens[random.Next(tokens.Count)];
            string text = random.Next(2) == 0 ? "" : other.Text;
            source = token.Span.End <= source.Length ? source.Remove(token.SpanStart, token.Span.Length)
                .Insert(token.SpanStart, text) : source;
        }

        return source;
    }
}
