using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// What an expression of a test means. Immutable and compared by structure; readers match these, never code shapes.
/// </summary>
abstract record Term
{
    /// <summary>A constant: bool, int, long, float, double, decimal, or a string that is only ever compared.</summary>
    public sealed record Known(object Value) : Term;

    /// <summary>
    /// A value computed anew each time its site is passed; two reads of one site in one pass are one value.
    /// </summary>
    public sealed record Draw(SyntaxNode Site, NumberKind Kind, IOperation Code) : Term
    {
        public bool Equals(Draw? other) => other is not null && other.Site == Site;

        public override int GetHashCode() => Site.GetHashCode();
    }

    /// <summary>
    /// An operator applied in the arithmetic of <paramref name="Kind"/>; for a conversion, the kind it converts to.
    /// </summary>
    public sealed record Apply(Operator Operator, NumberKind Kind, Term Left, Term? Right = null) : Term;

    /// <summary>One of two terms, by a condition.</summary>
    public sealed record If(Term Condition, Term Then, Term Else) : Term;

    /// <summary>The total of a term over the passes of nested loops, outermost loop first.</summary>
    public sealed record Sum(Term Each, ValueArray<ILoopOperation> Loops, long Passes, NumberKind Kind) : Term;

    /// <summary>Not followed. Absorbs every term it is part of.</summary>
    public sealed record Unknown(string Why) : Term;

    public static Term One(NumberKind kind) => Arithmetic.Convert(kind, 1) is { } one ? new Known(one)
        : new Unknown("not a number");

    public static Term Zero(NumberKind kind) => Arithmetic.Convert(kind, 0) is { } zero ? new Known(zero)
        : new Unknown("not a number");

    /// <summary>The operator applied, folded where both sides are known.</summary>
    public static Term Of(Operator op, NumberKind kind, Term left, Term? right = null)
    {
        if (left is Unknown)
            return left;
        if (right is Unknown)
            return right;
        if (left is Known a && (right is null or Known))
            return Arithmetic.Apply(op, kind, a.Value, (right as Known)?.Value) is { } value
                ? new Known(value)
                : new Unknown("constant arithmetic fails");
        // A conversion of a counted 0 or 1 belongs inside, so that `total += hit ? 1 : 0` counts in any type.
        if (op == Operator.Convert && left is If choice)
            return Choose(choice.Condition, Of(op, kind, choice.Then), Of(op, kind, choice.Else));
        if (op == Operator.Not && left is Apply { Operator: Operator.Not } twice)
            return twice.Left;
        return new Apply(op, kind, left, right);
    }

    /// <summary>The choice, with a counted complement `c ? 0 : 1` written as `¬c ? 1 : 0`.</summary>
    public static Term Choose(Term condition, Term then, Term otherwise)
    {
        if (condition is Unknown)
            return condition;
        if (then is Unknown)
            return then;
        if (otherwise is Unknown)
            return otherwise;
        if (condition is Known { Value: bool decided })
            return decided ? then : otherwise;
        return IsZero(then) && IsOne(otherwise) ? new If(Not(condition), otherwise, then)
            : new If(condition, then, otherwise);
    }

    public static Term Not(Term condition) => Of(Operator.Not, NumberKind.Boolean, condition);

    public static Term Both(Term left, Term right) => Of(Operator.And, NumberKind.Boolean, left, right);

    public static bool IsZero(Term term) => term is Known known && Arithmetic.Number(known.Value) == 0;

    public static bool IsOne(Term term) => term is Known known && Arithmetic.Number(known.Value) == 1;

    /// <summary>The terms this one is made of, itself first.</summary>
    public IEnumerable<Term> Parts() => this switch
    {
        Apply { Right: { } right } apply => [this, .. apply.Left.Parts(), .. right.Parts()],
        Apply apply => [this, .. apply.Left.Parts()],
        If choice => [this, .. choice.Condition.Parts(), .. choice.Then.Parts(), .. choice.Else.Parts()],
        Sum sum => [this, .. sum.Each.Parts()],
        _ => [this],
    };

    /// <summary>
    /// This term with every occurrence of <paramref name="part"/> replaced and constants folded again.
    /// </summary>
    public Term With(Term part, Term by) => this == part ? by : this switch
    {
        Apply apply => Of(apply.Operator, apply.Kind, apply.Left.With(part, by), apply.Right?.With(part, by)),
        If choice => Choose(choice.Condition.With(part, by), choice.Then.With(part, by), choice.Else.With(part, by)),
        _ => this,
    };
}
