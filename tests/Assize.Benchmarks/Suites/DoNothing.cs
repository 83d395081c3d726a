using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Benchmarks;

/// <summary>Asks the compiler for what Assize's analyzer asks for, and looks at none of it: the compiler's own cost.</summary>
[DiagnosticAnalyzer(LanguageNames.CSharp)]
sealed class DoNothing : DiagnosticAnalyzer
{
    static readonly DiagnosticDescriptor Nothing = new("NIL0001", "Nothing", "Nothing", "Nothing", DiagnosticSeverity.Info, true);

    public override ImmutableArray<DiagnosticDescriptor> SupportedDiagnostics { get; } = [Nothing];

    public override void Initialize(AnalysisContext context)
    {
        context.ConfigureGeneratedCodeAnalysis(GeneratedCodeAnalysisFlags.None);
        context.EnableConcurrentExecution();
        context.RegisterCompilationStartAction(start =>
        {
            // Attributes are bound once, for whoever asks first; the compiler needs them anyway.
            start.RegisterOperationBlockAction(block => block.OwningSymbol.GetAttributes());
            start.RegisterOperationAction(_ => { }, OperationKind.Invocation);
        });
    }
}
