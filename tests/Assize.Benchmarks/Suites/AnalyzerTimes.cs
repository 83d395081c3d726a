using System.Collections.Immutable;
using System.Reflection;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Benchmarks;

/// <summary>What the compiler charges analyzers for one suite, all in the same compilation.</summary>
/// <param name="Assize">Assize's analyzer, in seconds.</param>
/// <param name="Nothing">One that asks for the same and does nothing.</param>
/// <param name="Xunit">The test framework's own analyzers together.</param>
/// <param name="Findings">Diagnostics of Assize.</param>
sealed record AnalyzerTimes(double Assize, double Nothing, double Xunit, int Findings)
{
    static readonly ImmutableArray<MetadataReference> References =
    [
        .. ((string)AppContext.GetData("TRUSTED_PLATFORM_ASSEMBLIES")!).Split(Path.PathSeparator)
            .Where(path => !Path.GetFileName(path).StartsWith("Assize", StringComparison.Ordinal))
            .Select(path => MetadataReference.CreateFromFile(path)),
    ];

    static readonly Type[] XunitTypes =
    [
        .. System.Reflection.Assembly.LoadFrom(XunitPath).GetTypes()
            .Where(type => !type.IsAbstract && type.IsSubclassOf(typeof(DiagnosticAnalyzer))),
    ];

    static string XunitPath => typeof(AnalyzerTimes).Assembly.GetCustomAttributes<AssemblyMetadataAttribute>()
        .Single(found => found.Key == "XunitAnalyzers").Value!;

    /// <summary>The least of several compilations, each from the same trees and otherwise fresh.</summary>
    public static AnalyzerTimes Of(IReadOnlyList<SyntaxTree> trees, int repetitions)
    {
        var all = Enumerable.Range(0, repetitions).Select(_ => Once(trees).GetAwaiter().GetResult()).ToArray();
        return new(all.Min(one => one.Assize), all.Min(one => one.Nothing), all.Min(one => one.Xunit), all[0].Findings);
    }

    public static IReadOnlyList<SyntaxTree> Parse(IEnumerable<string> sources) =>
        [.. sources.Append(GeneratedSuite.Product).Select(source => CSharpSyntaxTree.ParseText(source, new(LanguageVersion.Latest)))];

    static async Task<AnalyzerTimes> Once(IReadOnlyList<SyntaxTree> trees)
    {
        var compilation = CSharpCompilation.Create("Suite", trees, References, new(OutputKind.DynamicallyLinkedLibrary));
        var assize = new Analyzers.RandomizedTests();
        var nothing = new DoNothing();
        var xunit = XunitTypes.Select(type => (DiagnosticAnalyzer)Activator.CreateInstance(type)!).ToArray();
        var options = new CompilationWithAnalyzersOptions(
            new AnalyzerOptions([]), (exception, _, _) => throw exception, concurrentAnalysis: false, logAnalyzerExecutionTime: true);
        var run = compilation.WithAnalyzers([nothing, assize, .. xunit], options);
        var found = await run.GetAnalyzerDiagnosticsAsync(CancellationToken.None).ConfigureAwait(false);
        async Task<double> Seconds(DiagnosticAnalyzer analyzer) =>
            (await run.GetAnalyzerTelemetryInfoAsync(analyzer, CancellationToken.None).ConfigureAwait(false)).ExecutionTime.TotalSeconds;
        double ofXunit = 0;
        foreach (var analyzer in xunit)
            ofXunit += await Seconds(analyzer).ConfigureAwait(false);
        int findings = found.Count(diagnostic => diagnostic.Id.StartsWith("ASZ", StringComparison.Ordinal));
        return new(await Seconds(assize).ConfigureAwait(false), await Seconds(nothing).ConfigureAwait(false), ofXunit, findings);
    }
}
