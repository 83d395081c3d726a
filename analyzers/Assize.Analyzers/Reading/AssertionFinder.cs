using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>The assertions of a test body that run on every path, each as what it demands.</summary>
sealed class AssertionFinder
{
    readonly TestFramework _framework;
    readonly Evaluator _evaluator;
    readonly Writes _writes;
    readonly TrialCountReader _counts;

    public AssertionFinder(TestFramework framework, Evaluator evaluator, Writes writes)
    {
        (_framework, _evaluator, _writes) = (framework, evaluator, writes);
        _counts = new TrialCountReader(evaluator, writes);
    }

    public Requirement? Read(IInvocationOperation call)
    {
        if (call.IsInsideFunction())
            return null;
        return _framework.IsFailure(call.TargetMethod)
            ? Guarded(call)
            : OnEveryPath(call, call.Around()) && Repeats(call) is { } repeats
                ? _framework.Read(call, _evaluator) is { } demand ? demand with { Repeats = repeats } : null
                : null;
    }

    // `if (c) fail` demands ¬c.
    public Requirement? Guarded(IOperation failure)
    {
        if (failure.IsInsideFunction()
            || failure.Around().OfType<IConditionalOperation>().FirstOrDefault() is not { WhenFalse: null } guard
            || !IsOnly(guard.WhenTrue, failure)
            || !OnEveryPath(guard, guard.Around())
            || Repeats(guard) is not { } repeats)
            return null;
        return new Requirement(Term.Not(_evaluator.Read(guard.Condition)), null, failure, repeats, false);
    }

    long? Repeats(IOperation assertion) => _counts.Passes(assertion.Loops());

    static bool IsOnly(IOperation body, IOperation failure) => body switch
    {
        IBlockOperation block => block.Operations.Length == 1 && IsOnly(block.Operations[0], failure),
        IExpressionStatementOperation statement => statement.Operation == failure,
        _ => body == failure,
    };

    // A `return` or `continue` further up may skip the assertion; then it is red less often than read.
    bool OnEveryPath(IOperation assertion, IEnumerable<IOperation> around)
    {
        IOperation inner = assertion;
        foreach (IOperation outer in around)
        {
            if (outer is IBlockOperation block
                && block.Operations.TakeWhile(statement => statement != inner).Any(MayLeave))
                return false;
            if (outer is not (
                IBlockOperation or IExpressionStatementOperation or ILoopOperation or IUsingOperation or ILockOperation))
                return false;
            inner = outer;
        }

        return true;
    }

    bool MayLeave(IOperation statement) => _writes.Jumps.Any(jump =>
        statement.Syntax.Span.Contains(jump.Syntax.Span) && jump switch
        {
            IReturnOperation => !jump.IsInsideFunction(),
            IBranchOperation { BranchKind: BranchKind.GoTo } => true,
            _ => !jump.Around()
                .TakeWhile(outer => statement.Syntax.Span.Contains(outer.Syntax.Span))
                .Any(outer => outer is ILoopOperation
                    || (outer is ISwitchOperation && jump is IBranchOperation { BranchKind: BranchKind.Break })),
        });
}
