using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>NUnit: classic assertions, and `Assert.That` with constraints.</summary>
sealed class NUnitFramework : TestFramework
{
    public override string Name => "NUnit";

    public override string AssertionType => "NUnit.Framework.Assert";

    public override bool IsTestAttribute(INamedTypeSymbol attribute) =>
        attribute.Name is "TestAttribute" or "TestCaseAttribute" or "TestCaseSourceAttribute" or "TheoryAttribute"
        && IsIn(attribute, "NUnit.Framework");

    public override bool IsAssertion(IMethodSymbol method) =>
        (method.ContainingType is { Name: "Assert" } type && IsIn(type, "NUnit.Framework"))
        || (method.ContainingType is { Name: "ClassicAssert" } classic && IsIn(classic, "NUnit.Framework.Legacy"));

    public override bool IsFailure(IMethodSymbol method) => method.Name == "Fail" && IsAssertion(method);

    public override DataRow? Row(AttributeData attribute) =>
        attribute.AttributeClass is { Name: "TestCaseAttribute" } type && IsIn(type, "NUnit.Framework")
            ? DataRow.Of(attribute) : null;

    public override Runs? RunsOf(AttributeData attribute)
    {
        if (attribute.AttributeClass is not { } type || !IsIn(type, "NUnit.Framework"))
            return base.RunsOf(attribute);
        int? count = attribute.ConstructorArguments.Length == 1 && attribute.ConstructorArguments[0].Kind != TypedConstantKind.Array
            ? attribute.ConstructorArguments[0].Value as int?
            : null;
        return type.Name switch
        {
            "RetryAttribute" => count is >= 1 ? new Runs(1, count.Value) : null,
            "RepeatAttribute" => count is >= 1 ? new Runs(count.Value, 1) : null,
            _ => base.RunsOf(attribute),
        };
    }

    public override Requirement? Read(IInvocationOperation call, Evaluator evaluator)
    {
        var arguments = call.Arguments
            .OrderBy(argument => argument.Parameter?.Ordinal)
            .Select(argument => argument.Value)
            .ToList();
        Term? condition = call.TargetMethod.Name switch
        {
            "True" or "IsTrue" => evaluator.Read(arguments[0]),
            "False" or "IsFalse" => Not(evaluator.Read(arguments[0])),
            "That" => That(call, evaluator, arguments),
            "Greater" => Compared(Operator.Greater, evaluator, arguments),
            "GreaterOrEqual" => Compared(Operator.GreaterOrEqual, evaluator, arguments),
            "Less" => Compared(Operator.Less, evaluator, arguments),
            "LessOrEqual" => Compared(Operator.LessOrEqual, evaluator, arguments),
            "AreEqual" when HasDelta(call.TargetMethod) => Within(
                NumberKind.Double, evaluator.Read(arguments[0]), evaluator.Read(arguments[1]),
                    evaluator.Read(arguments[2])),
            _ => null,
        };
        return condition is null ? null : Demand(condition, call);
    }

    static bool HasDelta(IMethodSymbol method) =>
        method.Parameters.Length >= 3 && method.Parameters.Take(3)
            .All(parameter => parameter.Type.SpecialType == SpecialType.System_Double);

    static Term? That(IInvocationOperation call, Evaluator evaluator, List<IOperation> arguments)
    {
        var parameters = call.TargetMethod.Parameters;
        if (parameters.Length >= 2 && parameters[1].Type.Name == "IResolveConstraint")
            return NUnitConstraints.Read(arguments[1], arguments[0], evaluator);
        return parameters[0].Type.SpecialType == SpecialType.System_Boolean ? evaluator.Read(arguments[0]) : null;
    }

    static Term? Compared(Operator op, Evaluator evaluator, List<IOperation> arguments) =>
        NUnitConstraints.Compared(op, arguments[0], arguments[1], evaluator);
}
