using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>How many passes a loop makes; null when that is not a constant.</summary>
sealed class TrialCountReader
{
    // Beyond this no test finishes; it also keeps products inside a long.
    const long MostPasses = 1_000_000_000_000;

    readonly Evaluator _evaluator;
    readonly Writes _writes;

    public TrialCountReader(Evaluator evaluator, Writes writes) => (_evaluator, _writes) = (evaluator, writes);

    public long? Passes(IEnumerable<ILoopOperation> loops)
    {
        long product = 1;
        foreach (ILoopOperation loop in loops)
        {
            if (Passes(loop) is not { } passes || passes > MostPasses / product)
                return null;
            product *= passes;
            if (product == 0)
                return null;
        }

        return product;
    }

    /// <summary>The expression the number of passes comes from.</summary>
    public static IOperation? Bound(ILoopOperation loop) => loop switch
    {
        IForLoopOperation { Condition: IBinaryOperation condition } => condition.RightOperand,
        IWhileLoopOperation { Condition: IBinaryOperation condition } => condition.RightOperand,
        IForEachLoopOperation each => RangeCount(each),
        _ => null,
    };

    long? Passes(ILoopOperation loop)
    {
        if (LeavesEarly(loop))
            return null;
        return loop switch
        {
            IForLoopOperation { Condition: IBinaryOperation condition } counted => Counted(counted, condition),
            IWhileLoopOperation { ConditionIsTop: true, ConditionIsUntil: false,
                Condition: IBinaryOperation condition } checkedFirst =>
                Counted(checkedFirst, condition),
            IForEachLoopOperation each => RangeCount(each) is { } count ? Whole(count) : null,
            _ => null,
        };
    }

    long? Counted(ILoopOperation loop, IBinaryOperation condition)
    {
        if (condition.LeftOperand.Unwrapped() is not ILocalReferenceOperation { Local: { } index }
            || Step(loop, index) is not { } step
            || Start(loop, index) is not { } start
            || Whole(condition.RightOperand) is not { } bound)
            return null;
        return condition.OperatorKind switch
        {
            BinaryOperatorKind.LessThan when step > 0 => Steps(bound - start, step),
            BinaryOperatorKind.LessThanOrEqual when step > 0 => Steps(bound - start + 1, step),
            BinaryOperatorKind.GreaterThan when step < 0 => Steps(start - bound, -step),
            BinaryOperatorKind.GreaterThanOrEqual when step < 0 => Steps(start - bound + 1, -step),
            BinaryOperatorKind.NotEquals when step == 1 && bound >= start => bound - start,
            BinaryOperatorKind.NotEquals when step == -1 && bound <= start => start - bound,
            _ => null,
        };
    }

    static long Steps(long distance, long step) => distance <= 0 ? 0 : (distance + step - 1) / step;

    // Exactly one write in the loop, made in every pass and with nothing that could skip it.
    long? Step(ILoopOperation loop, ILocalSymbol index)
    {
        if (_writes.To(index).Any(write => write.Kind == WriteKind.Opaque))
            return null;
        var inside = _writes.To(index).Where(write => loop.Encloses(write.Site) && !IsBefore(loop, write)).ToList();
        if (inside.Count != 1 || inside[0] is not { Kind: WriteKind.Add or WriteKind.Subtract } write)
            return null;
        if (!IsMadeInEveryPass(loop, write))
            return null;
        long? size = write.Value is null ? 1 : Whole(write.Value);
        return write.Kind == WriteKind.Add ? size : -size;
    }

    static bool IsMadeInEveryPass(ILoopOperation loop, Write write)
    {
        if (write.Site.Parent is not IExpressionStatementOperation statement)
            return false;
        return loop is IForLoopOperation counted
            ? counted.AtLoopBottom.Contains(statement)
            : statement.Parent == loop.Body && !Jumps(loop, BranchKind.Continue).Any();
    }

    long? Start(ILoopOperation loop, ILocalSymbol index)
    {
        var before = _writes.To(index).LastOrDefault(write => write.Kind == WriteKind.Set
            && (IsBefore(loop, write) || (write.End <= loop.Syntax.SpanStart && loop is IWhileLoopOperation)));
        if (before?.Value is null)
            return null;
        return IsBefore(loop, before)
            ? Whole(before.Value)
            : _evaluator.ValueBefore(index, loop) is Term.Known { Value: int or long } known
                ? System.Convert.ToInt64(known.Value) : null;
    }

    static bool IsBefore(ILoopOperation loop, Write write) =>
        loop is IForLoopOperation counted
            && counted.Before.Any(part => part.Syntax.Span.Contains(write.Site.Syntax.Span));

    static IOperation? RangeCount(IForEachLoopOperation each) =>
        each.Collection.Unwrapped() is IInvocationOperation
        {
            TargetMethod: { Name: "Range" or "Repeat",
                ContainingType: { Name: "Enumerable", ContainingNamespace.Name: "Linq" } },
        } range
            ? range.Arguments.FirstOrDefault(argument => argument.Parameter?.Name == "count")?.Value
            : null;

    long? Whole(IOperation operation) => _evaluator.Read(operation) switch
    {
        Term.Known { Value: int value } => value,
        Term.Known { Value: long value } when Math.Abs(value) <= MostPasses => value,
        _ => null,
    };

    // `throw` does not matter: whoever throws is red already.
    static bool LeavesEarly(ILoopOperation loop) =>
        Jumps(loop, BranchKind.Break).Any()
        || loop.Descendants().Any(part => part is IReturnOperation returning && !IsInFunctionWithin(loop, returning));

    /// <summary>The jumps of a kind that target this very loop.</summary>
    public static IEnumerable<IBranchOperation> Jumps(ILoopOperation loop, BranchKind kind) =>
        loop.Body.Descendants().OfType<IBranchOperation>().Where(branch => branch.BranchKind == kind
            && SymbolEqualityComparer.Default.Equals(
                branch.Target, kind == BranchKind.Break ? loop.ExitLabel : loop.ContinueLabel));

    static bool IsInFunctionWithin(ILoopOperation loop, IOperation operation) =>
        operation.Around().All(outer => outer != loop);
}
