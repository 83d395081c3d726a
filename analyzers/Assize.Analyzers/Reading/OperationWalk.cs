using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>What surrounds an operation, inside the function it belongs to.</summary>
static class OperationWalk
{
    /// <summary>The operations around this one, innermost first, up to and without the nearest function.</summary>
    public static IEnumerable<IOperation> Around(this IOperation operation)
    {
        for (IOperation? outer = operation.Parent; outer is not (null or IMethodBodyBaseOperation)
            && !IsFunction(outer); outer = outer.Parent)
            yield return outer;
    }

    public static bool IsInsideFunction(this IOperation operation)
    {
        for (IOperation? outer = operation.Parent; outer is not null; outer = outer.Parent)
        {
            if (IsFunction(outer))
                return true;
        }

        return false;
    }

    /// <summary>
    /// The loops whose body runs this operation once a pass, outermost first; a loop's start and bound are not in its
    /// body.
    /// </summary>
    public static ImmutableArray<ILoopOperation> Loops(this IOperation operation)
    {
        var loops = ImmutableArray.CreateBuilder<ILoopOperation>();
        IOperation inner = operation;
        foreach (IOperation outer in operation.Around())
        {
            if (outer is ILoopOperation loop && !IsBefore(loop, inner))
                loops.Insert(0, loop);
            inner = outer;
        }

        return loops.ToImmutable();
    }

    /// <summary>The operation without conversions that change no value seen by the reader.</summary>
    public static IOperation Unwrapped(this IOperation operation)
    {
        while (operation is IConversionOperation { OperatorMethod: null } conversion)
            operation = conversion.Operand;
        return operation is IAwaitOperation waiting ? waiting.Operation.Unwrapped() : operation;
    }

    public static bool Encloses(this ILoopOperation loop, IOperation operation) =>
        loop.Syntax.Span.Contains(operation.Syntax.Span);

    static bool IsBefore(ILoopOperation loop, IOperation part) => loop switch
    {
        IForLoopOperation counted => counted.Before.Contains(part),
        IForEachLoopOperation each => each.Collection == part,
        _ => false,
    };

    static bool IsFunction(IOperation operation) => operation is IAnonymousFunctionOperation or ILocalFunctionOperation;
}
