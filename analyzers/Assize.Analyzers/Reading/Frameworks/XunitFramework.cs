using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>xunit, v2 and v3: their assertions are spelled alike.</summary>
sealed class XunitFramework : TestFramework
{
    public override string Name => "xunit";

    public override string AssertionType => "Xunit.Assert";

    public override bool IsTestAttribute(INamedTypeSymbol attribute) => attribute.Name == "FactAttribute"
        && IsIn(attribute, "Xunit");

    public override bool IsAssertion(IMethodSymbol method) => method.ContainingType is { Name: "Assert" } type
        && IsIn(type, "Xunit");

    public override bool IsFailure(IMethodSymbol method) => method.Name == "Fail" && IsAssertion(method);

    public override DataRow? Row(AttributeData attribute) =>
        attribute.AttributeClass is { Name: "InlineDataAttribute" } type && IsIn(type, "Xunit") ? DataRow.Of(attribute)
            : null;

    public override Requirement? Read(IInvocationOperation call, Evaluator evaluator)
    {
        var arguments = call.Arguments
            .OrderBy(argument => argument.Parameter?.Ordinal)
            .Select(argument => argument.Value)
            .ToList();
        return call.TargetMethod.Name switch
        {
            "True" => Demand(evaluator.Read(arguments[0]), call),
            "False" => Demand(Not(evaluator.Read(arguments[0])), call),
            "InRange" when arguments.Count == 3 => InRange(call, evaluator, arguments),
            "Equal" when arguments.Count == 3 => Equal(call, evaluator, arguments),
            _ => null,
        };
    }

    static Requirement InRange(IInvocationOperation call, Evaluator evaluator, List<IOperation> arguments)
    {
        NumberKind kind = Arithmetic.KindOf(call.TargetMethod.Parameters[0].Type);
        Term actual = evaluator.Read(arguments[0]);
        return Demand(
            Both(
                Of(Operator.GreaterOrEqual, kind, actual, evaluator.Read(arguments[1])),
                Of(Operator.LessOrEqual, kind, actual, evaluator.Read(arguments[2]))),
            call);
    }

    // Equal(expected, actual, tolerance) of the floating types; Equal(expected, actual, precision) rounds both to
    // digits.
    static Requirement? Equal(IInvocationOperation call, Evaluator evaluator, List<IOperation> arguments)
    {
        var parameters = call.TargetMethod.Parameters;
        NumberKind kind = Arithmetic.KindOf(parameters[0].Type);
        NumberKind last = Arithmetic.KindOf(parameters[2].Type);
        Term expected = evaluator.Read(arguments[0]), actual = evaluator.Read(arguments[1]),
            bound = evaluator.Read(arguments[2]);
        if (kind is NumberKind.Double or NumberKind.Single && last == kind)
            return Demand(Within(kind, expected, actual, bound), call);
        if (kind is not (NumberKind.Double or NumberKind.Decimal)
            || bound is not Known { Value: int digits and >= 0 and <= 15 })
            return null;
        Term condition = Of(
            Operator.Equal, kind, Of(Operator.Round, kind, expected, bound), Of(Operator.Round, kind, actual, bound));
        return Arithmetic.Convert(kind, 0.5 * Math.Pow(10, -digits)) is { } half
            ? Demand(condition, call, Within(kind, expected, actual, new Known(half)))
            : null;
    }
}
