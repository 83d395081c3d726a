using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// Every write to every local and parameter of one body, in source order: made in one pass, asked backwards.
/// </summary>
sealed class Writes
{
    readonly Dictionary<ISymbol, List<Write>> _writes = new(SymbolEqualityComparer.Default);
    readonly List<IOperation> _jumps = [];

    public Writes(IOperation body)
    {
        foreach (IOperation operation in body.DescendantsAndSelf())
            Add(operation);
    }

    /// <summary>Every `return`, `break`, `continue` and `goto` of the body, those of functions inside it too.</summary>
    public IReadOnlyList<IOperation> Jumps => _jumps;

    /// <summary>Jumps that make source order meaningless.</summary>
    public bool HasGoto { get; private set; }

    public IReadOnlyList<Write> To(ISymbol symbol) =>
        _writes.TryGetValue(symbol, out var writes) ? writes : ImmutableArray<Write>.Empty;

    void Add(IOperation operation)
    {
        switch (operation)
        {
            case IVariableDeclaratorOperation { Initializer: not null } declared:
                Add(declared.Symbol, WriteKind.Set, declared, declared.Initializer.Value);
                break;
            case IVariableDeclaratorOperation { Parent: IVariableDeclarationOperation { Initializer: { } shared } } declared:
                Add(declared.Symbol, WriteKind.Set, declared, shared.Value);
                break;
            case ISimpleAssignmentOperation { IsRef: false } set:
                AddAssignment(set);
                break;
            case ICompoundAssignmentOperation { OperatorMethod: null } compound:
                Add(Variable(compound.Target), KindOf(compound), compound, compound.Value);
                break;
            case IIncrementOrDecrementOperation { OperatorMethod: null } step:
                var kind = step.Kind == OperationKind.Increment ? WriteKind.Add : WriteKind.Subtract;
                Add(Variable(step.Target), kind, step, null);
                break;
            case IAssignmentOperation other:
                AddOpaque(other.Target, other);
                break;
            case IArgumentOperation { Parameter.RefKind: RefKind.Ref or RefKind.Out } byReference:
                AddOpaque(byReference.Value, byReference);
                break;
            case IDeclarationPatternOperation { DeclaredSymbol: { } symbol } pattern:
                Add(symbol, WriteKind.Opaque, pattern, null);
                break;
            case IAddressOfOperation address:
                AddOpaque(address.Reference, address);
                break;
            case IBranchOperation branch:
                _jumps.Add(branch);
                HasGoto |= branch.BranchKind == BranchKind.GoTo;
                break;
            case IReturnOperation:
                _jumps.Add(operation);
                break;
        }
    }

    static WriteKind KindOf(ICompoundAssignmentOperation compound) => compound.OperatorKind switch
    {
        BinaryOperatorKind.Add => WriteKind.Add,
        BinaryOperatorKind.Subtract => WriteKind.Subtract,
        _ => WriteKind.Opaque,
    };

    // `hits = hits + 1` is an addition like any other.
    void AddAssignment(ISimpleAssignmentOperation set)
    {
        ISymbol? symbol = Variable(set.Target);
        if (symbol is not null
            && set.Value is IBinaryOperation { OperatorKind: BinaryOperatorKind.Add, OperatorMethod: null } sum
            && SymbolEqualityComparer.Default.Equals(Variable(sum.LeftOperand), symbol))
            Add(symbol, WriteKind.Add, set, sum.RightOperand);
        else
            Add(symbol, WriteKind.Set, set, set.Value);
    }

    // Tuples on the left, `out var` and the like: every variable inside changes.
    void AddOpaque(IOperation target, IOperation site)
    {
        foreach (IOperation part in target.DescendantsAndSelf())
            Add(Variable(part), WriteKind.Opaque, site, null);
    }

    void Add(ISymbol? symbol, WriteKind kind, IOperation site, IOperation? value)
    {
        if (symbol is null)
            return;
        if (!_writes.TryGetValue(symbol, out var writes))
            _writes.Add(symbol, writes = []);
        // A function runs when it is called, not where it is written.
        bool elsewhere = site.IsInsideFunction();
        writes.Add(elsewhere && kind != WriteKind.Opaque ? new Write(WriteKind.Opaque, site, null)
            : new Write(kind, site, value));
    }

    static ISymbol? Variable(IOperation operation) => operation switch
    {
        ILocalReferenceOperation local => local.Local,
        IParameterReferenceOperation parameter => parameter.Parameter,
        IDeclarationExpressionOperation declaration => Variable(declaration.Expression),
        _ => null,
    };
}
