using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>
/// C# arithmetic on boxed constants, replayed type by type. Null where C# would throw, or the types are not followed.
/// </summary>
static class Arithmetic
{
    public static NumberKind KindOf(ITypeSymbol? type) => type?.SpecialType switch
    {
        SpecialType.System_Boolean => NumberKind.Boolean,
        SpecialType.System_Int32 => NumberKind.Int32,
        SpecialType.System_Int64 => NumberKind.Int64,
        SpecialType.System_Single => NumberKind.Single,
        SpecialType.System_Double => NumberKind.Double,
        SpecialType.System_Decimal => NumberKind.Decimal,
        _ => NumberKind.Other,
    };

    /// <summary>The number as a double; null for what is not a number.</summary>
    public static double? Number(object value) => value switch
    {
        int number => number,
        long number => number,
        float number => number,
        double number => number,
        decimal number => (double)number,
        _ => null,
    };

    public static object? Apply(Operator op, NumberKind kind, object left, object? right)
    {
        try
        {
            return right is null ? Unary(op, kind, left) : Binary(op, left, right);
        }
        catch (ArithmeticException)
        {
            // Division by zero, or a decimal or digit count out of range: the test itself would throw.
            return null;
        }
        catch (ArgumentOutOfRangeException)
        {
            return null;
        }
    }

    public static object? Convert(NumberKind kind, object value) => (kind, value) switch
    {
        (NumberKind.Int32, int v) => v,
        (NumberKind.Int32, long v) => unchecked((int)v),
        (NumberKind.Int32, double v) when Math.Abs(v) < int.MaxValue => (int)v,
        (NumberKind.Int32, float v) when Math.Abs(v) < int.MaxValue => (int)v,
        (NumberKind.Int32, decimal v) when Math.Abs(v) < int.MaxValue => (int)v,
        (NumberKind.Int64, int v) => (long)v,
        (NumberKind.Int64, long v) => v,
        (NumberKind.Int64, double v) when Math.Abs(v) < long.MaxValue => (long)v,
        (NumberKind.Int64, float v) when Math.Abs(v) < long.MaxValue => (long)v,
        (NumberKind.Int64, decimal v) when Math.Abs(v) < long.MaxValue => (long)v,
        (NumberKind.Single, int v) => (float)v,
        (NumberKind.Single, long v) => (float)v,
        (NumberKind.Single, float v) => v,
        (NumberKind.Single, double v) => (float)v,
        (NumberKind.Single, decimal v) => (float)v,
        (NumberKind.Double, decimal v) => (double)v,
        (NumberKind.Double, int or long or float or double) => Number(value),
        (NumberKind.Decimal, int v) => (decimal)v,
        (NumberKind.Decimal, long v) => (decimal)v,
        (NumberKind.Decimal, decimal v) => v,
        (NumberKind.Decimal, double v) when Math.Abs(v) < 1e28 => (decimal)v,
        (NumberKind.Decimal, float v) when Math.Abs(v) < 1e28f => (decimal)v,
        (NumberKind.Boolean, bool v) => v,
        _ => null,
    };

    static object? Unary(Operator op, NumberKind kind, object value) => (op, value) switch
    {
        (Operator.Convert, _) => Convert(kind, value),
        (Operator.Not, bool v) => !v,
        (Operator.Negate, int v) => unchecked(-v),
        (Operator.Negate, long v) => unchecked(-v),
        (Operator.Negate, float v) => -v,
        (Operator.Negate, double v) => -v,
        (Operator.Negate, decimal v) => -v,
        (Operator.Absolute, int v) => Math.Abs(v),
        (Operator.Absolute, long v) => Math.Abs(v),
        (Operator.Absolute, float v) => Math.Abs(v),
        (Operator.Absolute, double v) => Math.Abs(v),
        (Operator.Absolute, decimal v) => Math.Abs(v),
        (Operator.Root, double v) => Math.Sqrt(v),
        _ => null,
    };

    static object? Binary(Operator op, object left, object right) => (left, right) switch
    {
        (int a, int b) => Whole(op, a, b) is { } value ? value is long whole ? unchecked((int)whole) : value : null,
        (long a, long b) => Whole(op, a, b),
        (float a, float b) => Real(op, a, b) is { } value ? value is double real ? (float)real : value : null,
        (double a, double b) => Real(op, a, b),
        (double a, int digits) when op == Operator.Round => Math.Round(a, digits),
        (decimal a, int digits) when op == Operator.Round => Math.Round(a, digits),
        (decimal a, decimal b) => Exact(op, a, b),
        (bool a, bool b) => Logic(op, a, b),
        (string a, string b) => op switch { Operator.Equal => a == b, Operator.NotEqual => a != b, _ => null },
        _ => null,
    };

    // For int operands the long result wraps to what C# gives: the ring operations commute with truncation.
    static object? Whole(Operator op, long a, long b) => unchecked(op switch
    {
        Operator.Add => a + b,
        Operator.Subtract => a - b,
        Operator.Multiply => a * b,
        Operator.Divide => a / b,
        Operator.Remainder => a % b,
        _ => Compare(op, a.CompareTo(b)),
    });

    // One float operation done in double and rounded once is the float operation: 53 ≥ 2 · 24 + 2 bits.
    static object? Real(Operator op, double a, double b) => op switch
    {
        Operator.Add => a + b,
        Operator.Subtract => a - b,
        Operator.Multiply => a * b,
        Operator.Divide => a / b,
        Operator.Remainder => a % b,
        _ when double.IsNaN(a) || double.IsNaN(b) => null,
        _ => Compare(op, a < b ? -1 : a > b ? 1 : 0),
    };

    static object? Exact(Operator op, decimal a, decimal b) => op switch
    {
        Operator.Add => a + b,
        Operator.Subtract => a - b,
        Operator.Multiply => a * b,
        Operator.Divide => a / b,
        Operator.Remainder => a % b,
        _ => Compare(op, a.CompareTo(b)),
    };

    static object? Logic(Operator op, bool a, bool b) => op switch
    {
        Operator.And => a && b,
        Operator.Or => a || b,
        Operator.Equal => a == b,
        Operator.NotEqual => a != b,
        _ => null,
    };

    static object? Compare(Operator op, int order) => op switch
    {
        Operator.Less => order < 0,
        Operator.LessOrEqual => order <= 0,
        Operator.Greater => order > 0,
        Operator.GreaterOrEqual => order >= 0,
        Operator.Equal => order == 0,
        Operator.NotEqual => order != 0,
        _ => null,
    };
}
