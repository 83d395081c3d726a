using System.Collections.Immutable;
using System.Reflection;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>Reads randomized tests and claims once, and lets every rule judge what was read.</summary>
[DiagnosticAnalyzer(LanguageNames.CSharp)]
public sealed class RandomizedTests : DiagnosticAnalyzer
{
    static readonly ImmutableArray<Rule> AllRules =
    [
        .. typeof(Rule).GetTypeInfo().Assembly.DefinedTypes
            .Where(type => !type.IsAbstract && typeof(Rule).GetTypeInfo().IsAssignableFrom(type))
            .Select(type => (Rule)Activator.CreateInstance(type.AsType())!)
            .OrderBy(rule => rule.Descriptor.Id, StringComparer.Ordinal),
    ];

    /// <inheritdoc/>
    public override ImmutableArray<DiagnosticDescriptor> SupportedDiagnostics { get; } =
        [.. AllRules.Select(rule => rule.Descriptor)];

    internal static ImmutableArray<Rule> Rules => AllRules;

    /// <inheritdoc/>
    public override void Initialize(AnalysisContext context)
    {
        context.ConfigureGeneratedCodeAnalysis(GeneratedCodeAnalysisFlags.None);
        context.EnableConcurrentExecution();
        context.RegisterCompilationStartAction(start =>
        {
            if (SuiteReader.For(start.Compilation) is { } suite)
                start.RegisterOperationBlockAction(block => ReadTest(block, suite));
            if (ClaimReader.For(start.Compilation) is { } claims)
                start.RegisterOperationAction(operation => ReadClaim(operation, claims), OperationKind.Invocation);
        });
    }

    static void ReadTest(OperationBlockAnalysisContext context, SuiteReader suite)
    {
        if (context.OwningSymbol is not IMethodSymbol { MethodKind: MethodKind.Ordinary } method)
            return;
        foreach (IOperation block in context.OperationBlocks)
        {
            if (block is not IBlockOperation || suite.Admit(method, block.Syntax) is not { } framework)
                continue;
            var limits = Limits.From(context.Options.AnalyzerConfigOptionsProvider.GetOptions(block.Syntax.SyntaxTree));
            foreach (AssertionReading reading in suite.Read(method, framework, block, context.CancellationToken))
                Judge(reading, limits, context.ReportDiagnostic);
        }
    }

    static void ReadClaim(OperationAnalysisContext context, ClaimReader claims)
    {
        var call = (IInvocationOperation)context.Operation;
        if (!claims.Makes(call) || claims.Read(call, context.CancellationToken) is not { } reading)
            return;
        Judge(reading, Limits.From(context.Options.AnalyzerConfigOptionsProvider.GetOptions(call.Syntax.SyntaxTree)),
            context.ReportDiagnostic);
    }

    static void Judge(Reading reading, Limits limits, Action<Diagnostic> report)
    {
        foreach (Rule rule in AllRules)
        {
            if (rule.Judge(reading, limits) is { } diagnostic)
                report(diagnostic);
        }
    }
}
