using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>
/// Solves a condition for one part of it, in real arithmetic: it proposes edges, and evaluation disposes.
/// </summary>
sealed class Isolation
{
    readonly Term _part;
    readonly bool _truncates;

    Isolation(Term part, bool truncates) => (_part, _truncates) = (part, truncates);

    /// <summary>Where the condition holds, truncation and rounding included.</summary>
    public static Interval? Solve(Term condition, Term part) => new Isolation(part, truncates: true)
        .Solve(condition, holds: true);

    /// <summary>Where the condition was meant to hold: as if its arithmetic never truncated.</summary>
    public static Interval? Meant(Term condition, Term part) => new Isolation(part, truncates: false)
        .Solve(condition, holds: true);

    Interval? Solve(Term condition, bool holds)
    {
        if (condition is not Apply { Right: var right, Left: var left } apply)
            return null;
        switch (apply.Operator)
        {
            case Operator.Not:
                return Solve(left, !holds);
            case Operator.And when holds:
            case Operator.Or when !holds:
                return Solve(left, holds) is { } a && Solve(right!, holds) is { } b ? a.And(b) : null;
            case Operator.Equal when holds:
                return Rounded(left, right!) ?? Rounded(right!, left);
            case Operator.Less or Operator.LessOrEqual or Operator.Greater or Operator.GreaterOrEqual:
                var op = holds ? apply.Operator : Opposite(apply.Operator);
                if (right is Known bound)
                    return Bound(left, op, Arithmetic.Number(bound.Value));
                return left is Known other ? Bound(right!, Mirrored(op), Arithmetic.Number(other.Value)) : null;
            default:
                return null;
        }
    }

    // round(x, d) = r holds within half a unit of the last digit; which rims pass, evaluation decides.
    Interval? Rounded(Term rounded, Term value) =>
        rounded is Apply { Operator: Operator.Round, Right: Known { Value: int digits } } apply
        && value is Known known && Arithmetic.Number(known.Value) is { } centre
        && Bound(apply.Left, Operator.GreaterOrEqual, centre - 0.5 * Math.Pow(10, -digits)) is { } low
        && Bound(apply.Left, Operator.LessOrEqual, centre + 0.5 * Math.Pow(10, -digits)) is { } high
            ? low.And(high)
            : null;

    Interval? Bound(Term term, Operator op, double? value)
    {
        if (value is not { } bound || double.IsNaN(bound) || double.IsInfinity(bound))
            return null;
        if (term == _part)
            return op is Operator.Less or Operator.LessOrEqual
                ? Interval.UpTo(bound, op == Operator.LessOrEqual)
                : Interval.From(bound, op == Operator.GreaterOrEqual);
        if (term is not Apply apply)
            return null;
        return apply.Operator switch
        {
            Operator.Convert => Converted(apply, op, bound),
            Operator.Negate => Bound(apply.Left, Mirrored(op), -bound),
            Operator.Absolute => Absolute(apply.Left, op, bound),
            Operator.Divide when IsWhole(apply.Kind) && _truncates => Divided(apply, op, bound),
            _ => Linear(term, op, bound),
        };
    }

    // From a fraction to a whole number C# cuts towards zero; below zero nothing is proposed.
    Interval? Converted(Apply apply, Operator op, double bound) =>
        IsWhole(apply.Kind) && _truncates
            && KindOf(apply.Left) is NumberKind.Single or NumberKind.Double or NumberKind.Decimal
            ? Cut(apply.Left, op, bound, 1)
            : Bound(apply.Left, op, bound);

    Interval? Divided(Apply apply, Operator op, double bound) =>
        apply.Right is Known divisor && Arithmetic.Number(divisor.Value) is > 0 and { } by
            ? Cut(apply.Left, op, bound, by) : null;

    // For x ≥ 0: ⌊x/d⌋ ≤ h ⇔ x < (⌊h⌋+1)·d and ⌊x/d⌋ ≥ l ⇔ x ≥ ⌈l⌉·d.
    Interval? Cut(Term term, Operator op, double bound, double by) => op switch
    {
        Operator.LessOrEqual => Bound(term, Operator.Less, (Math.Floor(bound) + 1) * by),
        Operator.Less => Bound(term, Operator.Less, Math.Ceiling(bound) * by),
        Operator.GreaterOrEqual when bound > 0 => Bound(term, Operator.GreaterOrEqual, Math.Ceiling(bound) * by),
        Operator.Greater when bound >= 0 => Bound(term, Operator.GreaterOrEqual, (Math.Floor(bound) + 1) * by),
        _ => null,
    };

    // |x| ≥ t holds on two sides: no single band.
    Interval? Absolute(Term term, Operator op, double bound) =>
        op is Operator.Less or Operator.LessOrEqual
        && Bound(term, op, bound) is { } high
        && Bound(term, Mirrored(op), -bound) is { } low
            ? low.And(high)
            : null;

    Interval? Linear(Term term, Operator op, double bound)
    {
        if (Slope(term) is not { } line || line.Slope == 0 || line.Part is null)
            return null;
        double cut = (bound - line.Offset) / line.Slope;
        return Bound(line.Part, line.Slope > 0 ? op : Mirrored(op), cut);
    }

    // term = Slope · Part + Offset, where Part is what is looked for or something nonlinear around it.
    (double Slope, Term? Part, double Offset)? Slope(Term term)
    {
        if (term is Known known)
            return Arithmetic.Number(known.Value) is { } number ? (0, null, number) : null;
        if (term is not Apply { Operator: Operator.Add or Operator.Subtract or Operator.Multiply or Operator.Divide,
            Right: { } right } apply
            || (apply.Operator == Operator.Divide && IsWhole(apply.Kind) && _truncates))
            return term is Apply { Operator: Operator.Convert } convert && !IsWhole(convert.Kind) ? Slope(convert.Left)
                : (1, term, 0);
        if (Slope(apply.Left) is not { } a || Slope(right) is not { } b)
            return null;
        return apply.Operator switch
        {
            Operator.Add when Same(a.Part, b.Part) => (a.Slope + b.Slope, a.Part ?? b.Part, a.Offset + b.Offset),
            Operator.Subtract when Same(a.Part, b.Part) => (a.Slope - b.Slope, a.Part ?? b.Part, a.Offset - b.Offset),
            Operator.Multiply when b.Part is null => (a.Slope * b.Offset, a.Part, a.Offset * b.Offset),
            Operator.Multiply when a.Part is null => (b.Slope * a.Offset, b.Part, b.Offset * a.Offset),
            Operator.Divide when b.Part is null && b.Offset != 0 => (a.Slope / b.Offset, a.Part, a.Offset / b.Offset),
            _ => null,
        };
    }

    static bool Same(Term? a, Term? b) => a is null || b is null || a == b;

    static bool IsWhole(NumberKind kind) => kind is NumberKind.Int32 or NumberKind.Int64;

    static NumberKind KindOf(Term term) => term switch
    {
        Apply apply => apply.Kind,
        Sum sum => sum.Kind,
        Draw draw => draw.Kind,
        _ => NumberKind.Other,
    };

    static Operator Opposite(Operator op) => op switch
    {
        Operator.Less => Operator.GreaterOrEqual,
        Operator.LessOrEqual => Operator.Greater,
        Operator.Greater => Operator.LessOrEqual,
        _ => Operator.Less,
    };

    static Operator Mirrored(Operator op) => op switch
    {
        Operator.Less => Operator.Greater,
        Operator.LessOrEqual => Operator.GreaterOrEqual,
        Operator.Greater => Operator.Less,
        _ => Operator.LessOrEqual,
    };
}
