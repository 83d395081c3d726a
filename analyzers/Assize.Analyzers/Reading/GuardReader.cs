using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>Under which condition a statement runs within one pass of the loops around it.</summary>
sealed class GuardReader
{
    readonly Evaluator _evaluator;

    public GuardReader(Evaluator evaluator) => _evaluator = evaluator;

    /// <summary>The step where its guards hold, and nothing where they do not.</summary>
    public Term Guarded(IOperation site, ImmutableArray<ILoopOperation> loops, Term step, NumberKind kind)
    {
        IOperation inner = site;
        foreach (IOperation outer in site.Around())
        {
            if (loops.IsEmpty && outer is ILoopOperation)
                break;
            step = outer switch
            {
                IBlockOperation block => SkippedOver(block, inner, step, kind),
                IConditionalOperation choice when inner == choice.Condition => new Unknown("changed in a condition"),
                IConditionalOperation choice when inner == choice.WhenTrue =>
                    Choose(_evaluator.Read(choice.Condition), step, Zero(kind)),
                IConditionalOperation choice => Choose(Not(_evaluator.Read(choice.Condition)), step, Zero(kind)),
                ILoopOperation or IExpressionStatementOperation or ILockOperation or IUsingOperation => step,
                _ => new Unknown("under " + outer.Kind),
            };
            if (step is Unknown || (!loops.IsEmpty && outer == loops[0]))
                break;
            inner = outer;
        }

        return step;
    }

    // `if (c) continue;` before the statement: it runs only where c does not hold.
    Term SkippedOver(IBlockOperation block, IOperation inner, Term step, NumberKind kind)
    {
        foreach (IOperation statement in block.Operations.TakeWhile(statement => statement != inner).Reverse())
        {
            if (!statement.DescendantsAndSelf().Any(IsContinueOfAnOuterLoop))
                continue;
            if (statement is not IConditionalOperation { WhenFalse: null } skip || !IsOnlyContinue(skip.WhenTrue))
                return new Unknown("continue");
            step = Choose(Not(_evaluator.Read(skip.Condition)), step, Zero(kind));
        }

        return step;

        bool IsContinueOfAnOuterLoop(IOperation part) =>
            part is IBranchOperation { BranchKind: BranchKind.Continue }
            && !part.Around().TakeWhile(outer => outer != block).OfType<ILoopOperation>().Any();
    }

    static bool IsOnlyContinue(IOperation body) => body switch
    {
        IBranchOperation { BranchKind: BranchKind.Continue } => true,
        IBlockOperation { Operations.Length: 1 } block => IsOnlyContinue(block.Operations[0]),
        _ => false,
    };
}
