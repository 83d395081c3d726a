using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>Whether a value is surely random, and drawn anew in the same way in every pass.</summary>
sealed class DrawReader
{
    const int MostDepth = 8;

    readonly Writes _writes;
    readonly RandomTypes _types;

    public DrawReader(Writes writes, RandomTypes types) => (_writes, _types) = (writes, types);

    public bool IsOnePerPass(IOperation draw, ImmutableArray<ILoopOperation> passes)
    {
        // Drawn outside the innermost loop, one value would serve many passes.
        if (passes.IsEmpty || !draw.Loops().Contains(passes[passes.Length - 1]))
            return false;
        return IsAlike(draw, passes, 0) && IsRandom(draw, passes, 0);
    }

    /// <summary>A generator of the framework itself, not a stub that derives from it.</summary>
    public bool IsPlainGenerator(IOperation? generator) => generator?.Unwrapped() switch
    {
        IObjectCreationOperation created => _types.IsRandom(created.Type),
        IPropertyReferenceOperation property => _types.IsShared(property.Property),
        ILocalReferenceOperation local => _writes.To(local.Local) is { Count: > 0 } writes
            && writes.All(
                write => write.Kind == WriteKind.Set && write.Value!.Unwrapped() is not ILocalReferenceOperation
                && IsPlainGenerator(write.Value)),
        IFieldReferenceOperation field => FieldReader.Initial(field) is { } initial && IsPlainGenerator(initial),
        _ => false,
    };

    // Nothing in it may differ from pass to pass but what is drawn: no index, no state carried along.
    bool IsAlike(IOperation operation, ImmutableArray<ILoopOperation> passes, int depth)
    {
        if (depth > MostDepth)
            return false;
        foreach (IOperation part in operation.DescendantsAndSelf())
        {
            if (part is IAssignmentOperation or IIncrementOrDecrementOperation or IAnonymousFunctionOperation or IInvalidOperation
                or IDynamicInvocationOperation)
                return false;
            if (part is ILocalReferenceOperation local && !IsAlike(local.Local, passes, depth))
                return false;
            if (part is IParameterReferenceOperation parameter && _writes.To(parameter.Parameter).Count > 0)
                return false;
            if (part is IMemberReferenceOperation member && IsWritten(member.Member, passes[0]))
                return false;
        }

        return true;
    }

    bool IsAlike(ILocalSymbol local, ImmutableArray<ILoopOperation> passes, int depth)
    {
        var inside = _writes.To(local).Where(write => passes.Any(loop => loop.Encloses(write.Site))).ToList();
        if (inside.Count == 0)
            return !IsElement(local, passes);
        // Made anew in every pass, from things that are alike themselves.
        return inside.Count == 1 && inside[0].Kind == WriteKind.Set && inside[0].Site is IVariableDeclaratorOperation
            && passes[passes.Length - 1].Body.Syntax.Span.Contains(inside[0].Site.Syntax.Span)
            && IsAlike(inside[0].Value!, passes, depth + 1);
    }

    static bool IsWritten(ISymbol member, ILoopOperation loop) => loop.Descendants().Any(part =>
        part switch
        {
            IAssignmentOperation assignment => assignment.Target,
            IIncrementOrDecrementOperation step => step.Target,
            IArgumentOperation { Parameter.RefKind: RefKind.Ref or RefKind.Out } argument => argument.Value,
            _ => null,
        } is IMemberReferenceOperation written && SymbolEqualityComparer.Default.Equals(written.Member, member));

    static bool IsElement(ILocalSymbol local, ImmutableArray<ILoopOperation> passes) =>
        passes.Any(loop => loop.Locals.Contains(local, SymbolEqualityComparer.Default));

    bool IsRandom(IOperation operation, ImmutableArray<ILoopOperation> passes, int depth)
    {
        var calls = operation.DescendantsAndSelf().OfType<IInvocationOperation>().ToList();
        if (calls.Exists(IsStub))
            return false;
        return calls.Exists(IsRandomCall)
            || (depth < MostDepth && operation.DescendantsAndSelf().OfType<ILocalReferenceOperation>().Any(local =>
                _writes.To(local.Local).Any(write => write is { Kind: WriteKind.Set, Value: { } value }
                    && passes[passes.Length - 1].Encloses(write.Site) && IsRandom(value, passes, depth + 1))));
    }

    // A class of the tests that stands in for a generator draws what it likes.
    bool IsStub(IInvocationOperation call) =>
        new[] { call.Instance?.Unwrapped().Type, call.TargetMethod.ContainingType }
            .Any(type => type is not null && _types.IsGenerator(type) && !type.DeclaringSyntaxReferences.IsEmpty);

    bool IsRandomCall(IInvocationOperation call)
    {
        IMethodSymbol method = call.TargetMethod;
        if (_types.IsGenerator(method.ContainingType))
            return call.Instance is null || !IsStubbed(call.Instance);
        if (call.Arguments.Any(argument => _types.IsGenerator(argument.Value.Unwrapped().Type)))
            return call.Arguments.All(argument => !IsStubbed(argument.Value));
        if (method.ReturnsVoid || RandomTypes.IsFramework(method.ContainingType)
            || method.MethodKind is MethodKind.DelegateInvoke or MethodKind.LocalFunction)
            return false;
        var scan = SourceScan.Of(method);
        return !scan.IsVisible || scan.MentionsGenerator;
    }

    bool IsStubbed(IOperation generator) => generator.Unwrapped() is ILocalReferenceOperation local
        && _writes.To(local.Local).Any(
            write => write.Value?.Unwrapped().Type is { } type && !type.DeclaringSyntaxReferences.IsEmpty);
}
