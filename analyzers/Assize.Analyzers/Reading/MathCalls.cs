using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>Calls of the framework's arithmetic, read as operators.</summary>
static class MathCalls
{
    /// <summary>The term; null for any other call.</summary>
    public static Term? Read(IInvocationOperation call, Evaluator evaluator)
    {
        var method = call.TargetMethod;
        if (method is not { IsStatic: true,
            ContainingType: { ContainingNamespace: { Name: "System",
            ContainingNamespace.IsGlobalNamespace: true } } type })
            return null;
        return (type.Name, method.Name, method.Parameters.Length) switch
        {
            ("Math" or "Double", "Abs", 1) => Of(Operator.Absolute, Arithmetic.KindOf(call.Type), Argument(0)),
            ("Math" or "Double", "Sqrt", 1) => evaluator.Root(Argument(0)),
            ("Math" or "Double", "Round", 1) =>
                Of(Operator.Round, Arithmetic.KindOf(call.Type), Argument(0), new Known(0)),
            ("Math" or "Double", "Round", 2) when Argument(1) is Known { Value: int } digits =>
                Of(Operator.Round, Arithmetic.KindOf(call.Type), Argument(0), digits),
            ("Math", "Pow", 2) when (Argument(0), Argument(1)) is (
                Known { Value: double x }, Known { Value: double y }) =>
                new Known(Math.Pow(x, y)),
            ("Math", "Min", 2) when (Argument(0), Argument(1)) is (Known a, Known b) =>
                Lesser(a, b, Operator.LessOrEqual),
            ("Math", "Max", 2) when (Argument(0), Argument(1)) is (Known a, Known b) =>
                Lesser(a, b, Operator.GreaterOrEqual),
            ("Math", "Floor", 1) when Argument(0) is Known { Value: double x } => new Known(Math.Floor(x)),
            ("Math", "Ceiling", 1) when Argument(0) is Known { Value: double x } => new Known(Math.Ceiling(x)),
            ("Convert", "ToDouble", 1) when Arithmetic.KindOf(method.Parameters[0].Type) is > NumberKind.Boolean =>
                Of(Operator.Convert, NumberKind.Double, Argument(0)),
            ("Convert", "ToInt32", 1) when Arithmetic.KindOf(method.Parameters[0].Type) == NumberKind.Boolean =>
                Choose(Argument(0), One(NumberKind.Int32), Zero(NumberKind.Int32)),
            _ => null,
        };

        Term Argument(int ordinal) =>
            call.Arguments.FirstOrDefault(argument => argument.Parameter?.Ordinal == ordinal) is { } argument
            ? evaluator.Read(argument.Value)
            : new Unknown("no such argument");
    }

    static Term Lesser(Known a, Known b, Operator keeps) =>
        Of(keeps, NumberKind.Other, a, b) is Known { Value: bool first } ? first ? a : b
            : new Unknown("not comparable");
}
