using System.Collections.Concurrent;
using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Analyzers.Tests;

/// <summary>
/// Compiles sources in memory against the assemblies of the running test, and runs the analyzer over them.
/// </summary>
static class Workbench
{
    static readonly ImmutableArray<MetadataReference> Platform =
    [
        .. ((string)AppContext.GetData("TRUSTED_PLATFORM_ASSEMBLIES")!).Split(Path.PathSeparator)
            .Where(path => !Path.GetFileName(path).StartsWith("Assize.Analyzers", StringComparison.Ordinal))
            .Select(path => MetadataReference.CreateFromFile(path)),
    ];

    static readonly ConcurrentDictionary<string, MetadataReference> Products = new();

    /// <summary>The code under test of the statements in tests and pages: signatures only are seen.</summary>
    public const string Orchard = """
        using System;
        namespace Orchard;
        public enum Colour { Green, Red }
        public sealed class Picker
        {
            readonly Random random;
            public Picker(double ripe = 0.5, Random? random = null) => this.random = random ?? new Random();
            public static Picker Seeded(int seed) => new(0.5, new Random(seed));
            public bool IsRipe() => random.Next(2) == 0;
            public bool IsRipe(int tree) => random.Next(2) == 0;
            public Colour Colour() => (Colour)random.Next(2);
            public string Name(Random from) => from.Next(2) == 0 ? "russet" : "pippin";
            public int Weight() => random.Next(90, 111);
            public System.Threading.Tasks.Task<bool> IsRipeAsync() => System.Threading.Tasks.Task.FromResult(IsRipe());
        }
        """;

    public static ImmutableArray<MetadataReference> References(string product) =>
        Platform.Add(Products.GetOrAdd(product, source => Assembly(source)));

    public static CSharpParseOptions Language { get; } = new(LanguageVersion.Latest);

    public static CSharpCompilation Compile(string source, string product = Orchard) =>
        Compile([CSharpSyntaxTree.ParseText(source, Language, "Test.cs")], product);

    public static CSharpCompilation Compile(IEnumerable<SyntaxTree> trees, string product = Orchard) =>
        CSharpCompilation.Create(
        "Tests", trees, References(product),
            new CSharpCompilationOptions(
            OutputKind.DynamicallyLinkedLibrary, nullableContextOptions: NullableContextOptions.Enable));

    public static async Task<ImmutableArray<Diagnostic>> Analyze(
        Compilation compilation, IReadOnlyDictionary<string, string>? settings = null)
    {
        var options = new CompilationWithAnalyzersOptions(
            new AnalyzerOptions([], new Settings(settings ?? ImmutableDictionary<string, string>.Empty)),
            (exception, _, _) => throw new InvalidOperationException("The analyzer threw.", exception),
            concurrentAnalysis: false,
            logAnalyzerExecutionTime: false);
        return await compilation.WithAnalyzers([new RandomizedTests()], options).GetAnalyzerDiagnosticsAsync(
            TestContext.Current.CancellationToken);
    }

    /// <summary>What is read in every test of a compilation, without any rule.</summary>
    public static IEnumerable<AssertionReading> Readings(Compilation compilation)
    {
        if (SuiteReader.For(compilation) is not { } suite)
            yield break;
        foreach (SyntaxTree tree in compilation.SyntaxTrees)
        {
            foreach (var reading in suite.Read(compilation.GetSemanticModel(tree), TestContext.Current.CancellationToken))
                yield return reading;
        }
    }

    static PortableExecutableReference Assembly(string source)
    {
        using var image = new MemoryStream();
        var result = CSharpCompilation.Create(
            "Product",
            [CSharpSyntaxTree.ParseText(source, Language)],
            Platform,
            new CSharpCompilationOptions(
                OutputKind.DynamicallyLinkedLibrary, nullableContextOptions: NullableContextOptions.Enable)).Emit(
                image);
        Assert.True(result.Success,
            string.Join('\n', result.Diagnostics.Where(found => found.Severity == DiagnosticSeverity.Error)));
        return MetadataReference.CreateFromImage(image.ToArray());
    }

    sealed class Settings(IReadOnlyDictionary<string, string> values) : AnalyzerConfigOptionsProvider
    {
        public override AnalyzerConfigOptions GlobalOptions { get; } = new Lines(values);

        public override AnalyzerConfigOptions GetOptions(SyntaxTree tree) => GlobalOptions;

        public override AnalyzerConfigOptions GetOptions(AdditionalText textFile) => GlobalOptions;

        sealed class Lines(IReadOnlyDictionary<string, string> values) : AnalyzerConfigOptions
        {
            public override bool TryGetValue(
                string key, [System.Diagnostics.CodeAnalysis.NotNullWhen(true)] out string? value) =>
                values.TryGetValue(key, out value);
        }
    }
}
