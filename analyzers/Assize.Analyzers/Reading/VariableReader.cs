using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>
/// The value of a local or parameter at a use: its last certain assignment, and what was added to it since.
/// </summary>
sealed class VariableReader
{
    readonly Evaluator _evaluator;
    readonly Writes _writes;
    readonly ImmutableDictionary<ISymbol, Term> _row;
    readonly TrialCountReader _counts;
    readonly GuardReader _guards;

    public VariableReader(Evaluator evaluator, Writes writes, ImmutableDictionary<ISymbol, Term> row)
    {
        (_evaluator, _writes, _row) = (evaluator, writes, row);
        _counts = new TrialCountReader(evaluator, writes);
        _guards = new GuardReader(evaluator);
    }

    public Term Read(ISymbol variable, IOperation use)
    {
        if (_writes.HasGoto)
            return new Unknown("goto");
        if (use.IsInsideFunction())
            return new Unknown("another function");

        var writes = _writes.To(variable);
        if (writes.Any(write => write.Kind == WriteKind.Opaque))
            return new Unknown("changed out of sight");

        ImmutableArray<ILoopOperation> around = use.Loops();
        Write? start = writes.LastOrDefault(write => IsCertain(write, use, around));
        ImmutableArray<ILoopOperation> startLoops = start?.Site.Loops() ?? [];
        Term value = start is null ? Parameter(variable) : _evaluator.Read(start.Value!);
        foreach (Write write in writes)
        {
            if (write == start || !MayComeBetween(write, start, startLoops, use, around))
                continue;
            Term added = Added(write, startLoops, around, KindOf(variable));
            value = IsZero(value) ? added : Of(Operator.Add, KindOf(variable), value, added);
        }

        return value;
    }

    Term Parameter(ISymbol variable) => _row.TryGetValue(variable, out Term? known) ? known : new Unknown("never set");

    // Set before the use, in every execution that reaches it, and again in every pass of each loop around both.
    static bool IsCertain(Write write, IOperation use, ImmutableArray<ILoopOperation> around) =>
        write.Kind == WriteKind.Set
        && write.End <= use.Syntax.SpanStart
        && write.Site.Loops().All(around.Contains)
        && write.Site.Around().TakeWhile(outer => !outer.Syntax.Span.Contains(use.Syntax.Span)).All(IsStraight);

    static bool IsStraight(IOperation outer) => outer is
        IBlockOperation or IExpressionStatementOperation or IVariableDeclarationGroupOperation or IVariableDeclarationOperation
        or IVariableInitializerOperation or IUsingOperation or ILockOperation or ISimpleAssignmentOperation or IConversionOperation;

    static bool MayComeBetween(
        Write write, Write? start, ImmutableArray<ILoopOperation> startLoops, IOperation use,
            ImmutableArray<ILoopOperation> around) =>
        (write.Start >= (start?.End ?? 0) && write.Start < use.Syntax.SpanStart
            && !write.Site.Syntax.Span.Contains(use.Syntax.Span))
        || write.Site.Loops().Any(loop => around.Contains(loop) && !startLoops.Contains(loop));

    Term Added(Write write, ImmutableArray<ILoopOperation> startLoops, ImmutableArray<ILoopOperation> around,
        NumberKind kind)
    {
        if (write.Kind is not (WriteKind.Add or WriteKind.Subtract))
            return new Unknown("set on some paths only");

        ImmutableArray<ILoopOperation> loops = [.. write.Site.Loops().Where(loop => !startLoops.Contains(loop))];
        if (loops.Any(around.Contains))
            return new Unknown("a running value");

        Term step = write.Value is null ? One(kind) : _evaluator.Read(write.Value);
        step = Of(Operator.Convert, kind, step);
        if (write.Kind == WriteKind.Subtract)
            step = Of(Operator.Negate, kind, step);
        step = _guards.Guarded(write.Site, loops, step, kind);
        if (loops.IsEmpty || step is Unknown)
            return step;
        return _counts.Passes(loops) is { } passes
            ? new Sum(step, new ValueArray<ILoopOperation>(loops), passes, kind)
            : new Unknown("passes not constant");
    }

    static NumberKind KindOf(ISymbol variable) =>
        Arithmetic.KindOf((variable as ILocalSymbol)?.Type ?? (variable as IParameterSymbol)?.Type);
}
