using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>The numbers of a claim of the kit cannot be met: it would be refused before its first trial.</summary>
sealed class ImpossibleClaim : Rule
{
    public const string Id = "ASZ1002";

    static readonly DiagnosticDescriptor Impossible = Describe(
        id: Id,
        severity: DiagnosticSeverity.Error,
        title: "The numbers of the claim cannot be met",
        message: "This claim will be refused: {0}");

    public ImpossibleClaim() : base(Impossible)
    {
    }

    // The core's sentences end with a full stop; a diagnostic's do not.
    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is ClaimReading { Refusal: { } refusal } ? Report(reading, null, refusal.TrimEnd('.')) : null;
}
