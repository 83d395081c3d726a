using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>Reads one test method: every statistical assertion in it, each on its own.</summary>
sealed class SuiteReader
{
    readonly TestMethods _tests;
    readonly RandomTypes _types;

    SuiteReader(TestMethods tests, RandomTypes types) => (_tests, _types) = (tests, types);

    /// <summary>A reader for a compilation; null when it has no test framework.</summary>
    public static SuiteReader? For(Compilation compilation) =>
        TestMethods.In(compilation) is { } tests ? new SuiteReader(tests, new RandomTypes(compilation)) : null;

    /// <summary>Whether a method can hold anything to read, told without looking at its operations.</summary>
    public TestFramework? Admit(IMethodSymbol method, SyntaxNode body) =>
        Gate.HasLoop(body) ? _tests.FrameworkOf(method) : null;

    /// <summary>Every randomized assertion of a file, with or without a rule for it, in source order.</summary>
    public IEnumerable<AssertionReading> Read(SemanticModel model, CancellationToken cancellation)
    {
        foreach (var test in model.SyntaxTree.GetRoot(cancellation).DescendantNodes().OfType<MethodDeclarationSyntax>())
        {
            // Nothing is bound before the method is known to be a test with something to read in it.
            if (test is not { Body: { } body, AttributeLists.Count: > 0 }
                || model.GetDeclaredSymbol(test, cancellation) is not { } method
                || Admit(method, body) is not { } framework
                || model.GetOperation(test, cancellation) is not IMethodBodyOperation { BlockBody: { } block })
                continue;
            foreach (AssertionReading reading in Read(method, framework, block, cancellation))
                yield return reading;
        }
    }

    public ImmutableArray<AssertionReading> Read(
        IMethodSymbol method, TestFramework framework, IOperation body, CancellationToken cancellation)
    {
        if (TestMethods.RunsOf(method, framework) is not { } runs)
            return [];
        var writes = new Writes(body);
        var rows = TestMethods.RowsOf(method, framework);
        var worst = new Dictionary<SyntaxNode, AssertionReading>();
        foreach (DataRow? row in rows.IsEmpty ? [null] : rows.Cast<DataRow?>())
        {
            cancellation.ThrowIfCancellationRequested();
            foreach (AssertionReading reading in ReadRow(method, framework, body, writes, row, runs, cancellation))
                Keep(worst, reading);
        }

        return [.. worst.Values.OrderBy(reading => reading.Location.SourceSpan.Start)];
    }

    static void Keep(Dictionary<SyntaxNode, AssertionReading> worst, AssertionReading reading)
    {
        SyntaxNode site = reading.Location.SourceTree!.GetRoot().FindNode(reading.Location.SourceSpan);
        if (!worst.TryGetValue(site, out var known) || known.FalseFailure.Upper < reading.FalseFailure.Upper)
            worst[site] = reading;
    }

    IEnumerable<AssertionReading> ReadRow(
        IMethodSymbol method, TestFramework framework, IOperation body, Writes writes, DataRow? row, Runs runs,
            CancellationToken cancellation)
    {
        var known = row?.Bind(method) ?? ImmutableDictionary.Create<ISymbol, Term>(SymbolEqualityComparer.Default);
        var requirements = body.Descendants()
            .Where(operation => IsCandidate(operation, framework))
            .Select(operation => Demand(operation, framework, writes, known, cancellation))
            .OfType<Requirement>()
            .ToList();
        var subject = new Subject(
            writes, _types, new Evaluator(writes, known, cancellation), row, runs, framework.Name, NameOf(method));
        foreach (Requirement requirement in Pairing.Of(requirements))
        {
            cancellation.ThrowIfCancellationRequested();
            if (subject.Read(requirement) is { } reading)
                yield return reading;
        }
    }

    static string NameOf(IMethodSymbol method) => method.ToDisplayString(SymbolDisplayFormat.CSharpErrorMessageFormat
        .WithParameterOptions(SymbolDisplayParameterOptions.None)
        .WithMemberOptions(SymbolDisplayMemberOptions.IncludeContainingType));

    static bool IsCandidate(IOperation operation, TestFramework framework) =>
        operation is IThrowOperation || (operation is IInvocationOperation call && framework.IsAssertion(call.TargetMethod));

    static Requirement? Demand(
        IOperation operation,
        TestFramework framework,
        Writes writes,
        ImmutableDictionary<ISymbol, Term> known,
        CancellationToken cancellation)
    {
        var evaluator = new Evaluator(writes, known, cancellation);
        var finder = new AssertionFinder(framework, evaluator, writes);
        Requirement? requirement = operation is IInvocationOperation call ? finder.Read(call) : finder.Guarded(operation);
        return requirement is { Condition: not (Term.Unknown or Term.Known) }
            ? requirement with { TookRoot = evaluator.TookRoot }
            : null;
    }
}
