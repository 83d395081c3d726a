using System.Collections.Immutable;
using Assize.Bounds;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>
/// Reads a claim of the kit from its outermost term inwards: `Claim.Rate(…).WithRisk(…).WithTrials(…)`.
/// </summary>
sealed class ClaimReader
{
    readonly INamedTypeSymbol _claim;
    readonly INamedTypeSymbol? _terms;

    ClaimReader(INamedTypeSymbol claim, INamedTypeSymbol? terms) => (_claim, _terms) = (claim, terms);

    /// <summary>A reader for a compilation; null when it does not use the kit.</summary>
    public static ClaimReader? For(Compilation compilation) =>
        compilation.GetTypeByMetadataName("Assize.Claim") is { } claim
        ? new ClaimReader(claim, compilation.GetTypeByMetadataName("Assize.ClaimTerms"))
        : null;

    /// <summary>Whether a call makes a claim about a rate.</summary>
    public bool Makes(IInvocationOperation call) =>
        call.TargetMethod is { IsStatic: true, Name: "Rate" or "RateAtLeast" or "RateAtMost" }
        && SymbolEqualityComparer.Default.Equals(call.TargetMethod.ContainingType, _claim);

    public ClaimReading? Read(IInvocationOperation made, CancellationToken cancellation)
    {
        var evaluator = new Evaluator(
            new Writes(Body(made)), ImmutableDictionary.Create<ISymbol, Term>(SymbolEqualityComparer.Default),
                cancellation);
        double? Number(IOperation? value) =>
            value is not null && evaluator.Read(value) is Term.Known known ? Arithmetic.Number(known.Value) : null;

        double risk = UsualTerms.Risk, confidence = UsualTerms.Confidence;
        IInvocationOperation? trialsCall = null;
        foreach (IInvocationOperation term in Terms(made))
        {
            switch (term.TargetMethod.Name)
            {
                case "WithRisk" when Number(ValueOf(term)) is { } number:
                    risk = number;
                    break;
                case "WithConfidence" when Number(ValueOf(term)) is { } number:
                    confidence = number;
                    break;
                case "WithRisk" or "WithConfidence":
                    return null;
                case "WithTrials":
                    trialsCall = term;
                    break;
            }
        }

        if (EdgesOf(made, Number) is not { } edges)
            return null;
        cancellation.ThrowIfCancellationRequested();
        return Plan(edges, risk, confidence) is { } plan ? Reading(made, trialsCall, plan, Number) : null;
    }

    static ClaimReading? Reading(
        IInvocationOperation made, IInvocationOperation? trialsCall, ClaimPlan plan, Func<IOperation?, double?> number)
    {
        if (plan.Refusal is not null)
            return new ClaimReading(made.Syntax.GetLocation(), null, null, null, plan.Refusal);
        if (trialsCall is null)
            return new ClaimReading(made.Syntax.GetLocation(), null, null, plan.Needed, null);
        if (ValueOf(trialsCall) is not { } argument || number(argument) is not { } trials)
            return null;
        return new ClaimReading(
            argument.Syntax.GetLocation(), LiteralReader.Of(argument), (long)trials, plan.Needed, null);
    }

    static Func<Edges>? EdgesOf(IInvocationOperation made, Func<IOperation?, double?> number)
    {
        if (number(Argument(made, "target")) is not { } target)
            return null;
        double? defect = number(Argument(made, "defect"));
        bool isDefault = made.Arguments.Any(
            argument => argument is { Parameter.Name: "defect", ArgumentKind: ArgumentKind.DefaultValue });
        if (made.TargetMethod.Name != "Rate")
            return defect is not { } distance ? null
                : made.TargetMethod.Name == "RateAtLeast" ? () => Edges.AtLeast(Domain.Rate, target, distance)
                : () => Edges.AtMost(Domain.Rate, target, distance);
        if (number(Argument(made, "tolerance")) is not { } tolerance || (defect is null && !isDefault))
            return null;
        return () => Edges.Around(Domain.Rate, target, tolerance, defect);
    }

    static ClaimPlan? Plan(Func<Edges> edges, double risk, double confidence) => Question.AskFor(() =>
    {
        try
        {
            return new ClaimPlan(RatePlan.For(edges(), risk, confidence).Trials, null);
        }
        catch (ClaimRefusedException refusal)
        {
            return new ClaimPlan(null, refusal.Message);
        }
    });

    // The chain of `With…` around the call, innermost first, whether written as extensions or as members.
    IEnumerable<IInvocationOperation> Terms(IInvocationOperation made)
    {
        IOperation inner = made;
        while (Next(inner) is { } term)
        {
            yield return term;
            inner = term;
        }
    }

    IInvocationOperation? Next(IOperation inner)
    {
        IOperation? outer = inner.Parent;
        while (outer is IConversionOperation or IArgumentOperation { Parameter.Ordinal: 0 })
            outer = outer.Parent;
        return outer is IInvocationOperation call && IsTerm(call.TargetMethod) ? call : null;
    }

    bool IsTerm(IMethodSymbol method) =>
        (_terms is not null && SymbolEqualityComparer.Default.Equals(method.ContainingType, _terms))
        || (method.ContainingType is { } type && type.ContainingNamespace?.Name == "Assize"
            && method.Name.StartsWith("With", StringComparison.Ordinal));

    // The one value of a term: the claim itself comes first where the term is an extension.
    static IOperation? ValueOf(IInvocationOperation term) =>
        term.Arguments.FirstOrDefault(
            argument => argument.Parameter?.Ordinal == (term.Instance is null ? 1 : 0))?.Value;

    static IOperation? Argument(IInvocationOperation call, string parameter) =>
        call.Arguments.FirstOrDefault(argument => argument.Parameter?.Name == parameter)?.Value is { } value
        && value.ConstantValue is not { HasValue: true, Value: null }
            ? value
            : null;

    static IOperation Body(IOperation operation)
    {
        while (operation.Parent is { } outer)
            operation = outer;
        return operation;
    }

    sealed record ClaimPlan(long? Needed, string? Refusal);
}
