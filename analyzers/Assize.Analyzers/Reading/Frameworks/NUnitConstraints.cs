using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>
/// A constraint object read inside out as a condition on the actual value; null for any link that is not followed.
/// </summary>
static class NUnitConstraints
{
    public static Term? Read(IOperation constraint, IOperation actual, Evaluator evaluator)
    {
        switch (Bare(constraint))
        {
            case IBinaryOperation { OperatorKind: BinaryOperatorKind.And } joined:
                return Joined(
                    Read(joined.LeftOperand, actual, evaluator), Read(joined.RightOperand, actual, evaluator));
            case IPropertyReferenceOperation { Property.Name: "Percent",
                Instance: IInvocationOperation within } when IsWithin(within):
                return After(within.Instance!, Near(within, actual, evaluator, percent: true), actual, evaluator);
            case IPropertyReferenceOperation { Property.Name: "True" } property:
                return After(property, evaluator.Read(Bare(actual)), actual, evaluator);
            case IPropertyReferenceOperation { Property.Name: "False" } property:
                return After(property, Not(evaluator.Read(Bare(actual))), actual, evaluator);
            case IInvocationOperation within when IsWithin(within):
                return After(within.Instance!, Near(within, actual, evaluator, percent: false), actual, evaluator);
            case IInvocationOperation call:
                return After(call, Called(call, actual, evaluator), actual, evaluator);
            default:
                return null;
        }
    }

    public static Term? Compared(Operator op, IOperation left, IOperation right, Evaluator evaluator)
    {
        left = Bare(left);
        right = Bare(right);
        return Common(left, right) is { } kind
            ? Of(op, kind, Of(Operator.Convert, kind, evaluator.Read(left)),
                Of(Operator.Convert, kind, evaluator.Read(right)))
            : null;
    }

    /// <summary>The value before it was boxed or handed over as a constraint.</summary>
    public static IOperation Bare(IOperation operation)
    {
        while (operation is IConversionOperation conversion && Arithmetic.KindOf(conversion.Type) == NumberKind.Other)
            operation = conversion.Operand;
        return operation;
    }

    static bool IsWithin(IInvocationOperation call) =>
        call is { TargetMethod.Name: "Within", Arguments.Length: 1, Instance: IInvocationOperation };

    static Term? Called(IInvocationOperation call, IOperation actual, Evaluator evaluator)
    {
        IOperation Argument(int at) => call.Arguments[at].Value;
        return (call.TargetMethod.Name, call.Arguments.Length) switch
        {
            ("InRange", 2) => Joined(
                Compared(Operator.GreaterOrEqual, actual, Argument(0), evaluator),
                Compared(Operator.LessOrEqual, actual, Argument(1), evaluator)),
            ("GreaterThan", 1) => Compared(Operator.Greater, actual, Argument(0), evaluator),
            ("GreaterThanOrEqualTo" or "AtLeast", 1) =>
                Compared(Operator.GreaterOrEqual, actual, Argument(0), evaluator),
            ("LessThan", 1) => Compared(Operator.Less, actual, Argument(0), evaluator),
            ("LessThanOrEqualTo" or "AtMost", 1) => Compared(Operator.LessOrEqual, actual, Argument(0), evaluator),
            _ => null,
        };
    }

    static Term? Near(IInvocationOperation within, IOperation actual, Evaluator evaluator, bool percent)
    {
        if (within.Instance is not IInvocationOperation { TargetMethod.Name: "EqualTo", Arguments.Length: 1 } equal)
            return null;
        IOperation expected = Bare(equal.Arguments[0].Value), tolerance = Bare(within.Arguments[0].Value);
        actual = Bare(actual);
        NumberKind given = Arithmetic.KindOf(tolerance.Type);
        if (Common(expected, actual) is not { } kind || given is not (NumberKind.Int32 or NumberKind.Double))
            return null;
        // Whole numbers with a fractional tolerance: the framework rounds it first.
        if (!percent && kind is NumberKind.Int32 or NumberKind.Int64 && given == NumberKind.Double)
            return null;
        Term Converted(IOperation value, NumberKind to) => Of(Operator.Convert, to, evaluator.Read(value));
        return percent
            ? Relative(kind, Converted(expected, kind), Converted(actual, kind),
                Converted(tolerance, NumberKind.Double))
            : Of(Operator.LessOrEqual, kind, Distance(kind, Converted(expected, kind), Converted(actual, kind)),
                Converted(tolerance, kind));
    }

    // |(expected − actual) / expected| ≤ percent / 100, the difference taken in the type of the values.
    static Term? Relative(NumberKind kind, Term expected, Term actual, Term percent)
    {
        if (expected is not Known known || Arithmetic.Number(known.Value) is null or 0)
            return null;
        Term AsDouble(Term term) => Of(Operator.Convert, NumberKind.Double, term);
        Term difference = AsDouble(Of(Operator.Subtract, kind, expected, actual));
        return Of(
            Operator.LessOrEqual,
            NumberKind.Double,
            Of(Operator.Absolute, NumberKind.Double,
                Of(Operator.Divide, NumberKind.Double, difference, AsDouble(expected))),
            Of(Operator.Divide, NumberKind.Double, percent, new Known(100.0)));
    }

    static Term Distance(NumberKind kind, Term expected, Term actual) =>
        Of(Operator.Absolute, kind, Of(Operator.Subtract, kind, expected, actual));

    // What stands before the link: the start of the sentence, or `… .And`.
    static Term? After(IOperation link, Term? condition, IOperation actual, Evaluator evaluator)
    {
        IOperation? before = link switch
        {
            IInvocationOperation call => call.Instance,
            IPropertyReferenceOperation property => property.Instance,
            _ => link,
        };
        return before switch
        {
            null => condition,
            IPropertyReferenceOperation { Property.Name: "And", Instance: { } first } =>
                Joined(Read(first, actual, evaluator), condition),
            _ => null,
        };
    }

    static Term? Joined(Term? left, Term? right) => left is null || right is null ? null : Both(left, right);

    // The framework compares in double as soon as one side is floating; decimals are not followed.
    static NumberKind? Common(IOperation a, IOperation b)
    {
        NumberKind left = Arithmetic.KindOf(a.Type), right = Arithmetic.KindOf(b.Type);
        if (left is NumberKind.Other or NumberKind.Boolean or NumberKind.Decimal
            || right is NumberKind.Other or NumberKind.Boolean or NumberKind.Decimal)
            return null;
        if (left is NumberKind.Single or NumberKind.Double || right is NumberKind.Single or NumberKind.Double)
            return NumberKind.Double;
        return left == NumberKind.Int64 || right == NumberKind.Int64 ? NumberKind.Int64 : NumberKind.Int32;
    }
}
