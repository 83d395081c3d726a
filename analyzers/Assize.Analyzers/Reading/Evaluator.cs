using System.Collections.Immutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>
/// From operations to terms: the one recursive reader. It starts at an assertion and asks only for what that needs.
/// </summary>
sealed class Evaluator
{
    const int MostNodes = 2000;

    readonly VariableReader _variables;
    readonly CancellationToken _cancellation;
    int _nodes;

    /// <param name="writes">The writes of the body that is read.</param>
    /// <param name="row">What is known of the test's parameters: one data row.</param>
    /// <param name="cancellation">Looked at every 64 nodes.</param>
    public Evaluator(Writes writes, ImmutableDictionary<ISymbol, Term> row, CancellationToken cancellation)
    {
        _variables = new VariableReader(this, writes, row);
        _cancellation = cancellation;
    }

    /// <summary>
    /// Whether a square root was taken: the band then moves with the trials, and more of them do not help.
    /// </summary>
    public bool TookRoot { get; private set; }

    public Term Read(IOperation operation)
    {
        if (++_nodes > MostNodes)
            return new Unknown("too large");
        if (_nodes % 64 == 0)
            _cancellation.ThrowIfCancellationRequested();

        if (operation is { ConstantValue: { HasValue: true, Value: { } constant } } && Followed(constant) is { } value)
            return new Known(value);

        return operation switch
        {
            ILocalReferenceOperation local => _variables.Read(local.Local, local),
            IParameterReferenceOperation parameter => _variables.Read(parameter.Parameter, parameter),
            IFieldReferenceOperation field => FieldReader.Initial(field) is { } initial ? Read(initial)
                : new Unknown("field"),
            IConversionOperation conversion => ReadConversion(conversion),
            IUnaryOperation { OperatorMethod: null } unary => ReadUnary(unary),
            IBinaryOperation { OperatorMethod: null, IsLifted: false } binary => ReadBinary(binary),
            IBinaryOperation { OperatorMethod.ContainingType.SpecialType: SpecialType.System_Decimal or SpecialType.System_String } binary =>
                ReadBinary(binary),
            IConditionalOperation { WhenFalse: { } otherwise } choice =>
                Choose(Read(choice.Condition), Read(choice.WhenTrue), Read(otherwise)),
            IIsPatternOperation pattern => ReadPattern(pattern),
            IInvocationOperation call => MathCalls.Read(call, this) ?? NewDraw(call),
            IAwaitOperation waiting => Read(waiting.Operation),
            _ => NewDraw(operation),
        };
    }

    /// <summary>What a variable holds just before a loop is entered.</summary>
    public Term ValueBefore(ILocalSymbol variable, ILoopOperation loop) => _variables.Read(variable, loop);

    public Term Root(Term of)
    {
        TookRoot = true;
        return Of(Operator.Root, NumberKind.Double, of);
    }

    Term ReadConversion(IConversionOperation conversion)
    {
        if (conversion.OperatorMethod is { ContainingType.SpecialType: not SpecialType.System_Decimal })
            return NewDraw(conversion);
        NumberKind to = Arithmetic.KindOf(conversion.Type);
        Term operand = Read(conversion.Operand);
        if (to == NumberKind.Other || to == Arithmetic.KindOf(conversion.Operand.Type))
            return operand;
        // An unboxed or enum value has no number to convert, but a draw stays a draw.
        return Arithmetic.KindOf(conversion.Operand.Type) == NumberKind.Other && operand is not Known
            ? operand
            : Of(Operator.Convert, to, operand);
    }

    Term ReadUnary(IUnaryOperation unary)
    {
        NumberKind kind = Arithmetic.KindOf(unary.Type);
        return unary.OperatorKind switch
        {
            UnaryOperatorKind.Plus => Read(unary.Operand),
            UnaryOperatorKind.Minus => Of(Operator.Negate, kind, Read(unary.Operand)),
            UnaryOperatorKind.Not when kind == NumberKind.Boolean => Not(Read(unary.Operand)),
            _ => NewDraw(unary),
        };
    }

    Term ReadBinary(IBinaryOperation binary) => OperatorOf(binary.OperatorKind) is { } op
        ? Of(op, Arithmetic.KindOf(binary.LeftOperand.Type), Read(binary.LeftOperand), Read(binary.RightOperand))
        : NewDraw(binary);

    Term ReadPattern(IIsPatternOperation pattern)
    {
        Term value = Read(pattern.Value);
        NumberKind kind = Arithmetic.KindOf(pattern.Value.Type);
        return ReadPattern(pattern.Pattern, value, kind) ?? NewDraw(pattern);
    }

    Term? ReadPattern(IPatternOperation pattern, Term value, NumberKind kind) => pattern switch
    {
        IRelationalPatternOperation relation when OperatorOf(relation.OperatorKind) is { } op =>
            Of(op, kind, value, Read(relation.Value)),
        IConstantPatternOperation constant => Of(Operator.Equal, kind, value, Read(constant.Value)),
        INegatedPatternOperation negated => ReadPattern(negated.Pattern, value, kind) is { } inner ? Not(inner) : null,
        IBinaryPatternOperation { OperatorKind: BinaryOperatorKind.And or BinaryOperatorKind.Or } joined
            when ReadPattern(joined.LeftPattern, value, kind) is { } left
                && ReadPattern(joined.RightPattern, value, kind) is { } right =>
            Of(joined.OperatorKind == BinaryOperatorKind.And ? Operator.And : Operator.Or, NumberKind.Boolean, left,
                right),
        _ => null,
    };

    // Whatever calls something may differ in every pass; LawReader decides whether it is random. The rest is not
    // followed.
    static Term NewDraw(IOperation operation) => operation.DescendantsAndSelf()
        .Any(part => part is IInvocationOperation)
        ? new Draw(operation.Syntax, Arithmetic.KindOf(operation.Type), operation)
        : new Unknown(operation.Kind.ToString());

    static Operator? OperatorOf(BinaryOperatorKind kind) => kind switch
    {
        BinaryOperatorKind.Add => Operator.Add,
        BinaryOperatorKind.Subtract => Operator.Subtract,
        BinaryOperatorKind.Multiply => Operator.Multiply,
        BinaryOperatorKind.Divide => Operator.Divide,
        BinaryOperatorKind.Remainder => Operator.Remainder,
        BinaryOperatorKind.LessThan => Operator.Less,
        BinaryOperatorKind.LessThanOrEqual => Operator.LessOrEqual,
        BinaryOperatorKind.GreaterThan => Operator.Greater,
        BinaryOperatorKind.GreaterThanOrEqual => Operator.GreaterOrEqual,
        BinaryOperatorKind.Equals => Operator.Equal,
        BinaryOperatorKind.NotEquals => Operator.NotEqual,
        BinaryOperatorKind.ConditionalAnd or BinaryOperatorKind.And => Operator.And,
        BinaryOperatorKind.ConditionalOr or BinaryOperatorKind.Or => Operator.Or,
        _ => null,
    };

    static object? Followed(object constant) => constant switch
    {
        bool or int or long or float or double or decimal or string => constant,
        byte value => (int)value,
        sbyte value => (int)value,
        short value => (int)value,
        ushort value => (int)value,
        _ => null,
    };
}
