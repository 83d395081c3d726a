using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A claim of the kit is given fewer trials than its plan takes.</summary>
sealed class TooFewTrials : Rule
{
    public const string Id = "ASZ1001";

    static readonly DiagnosticDescriptor TooFew = Describe(
        id: Id,
        severity: DiagnosticSeverity.Warning,
        title: "Too few trials for the claim",
        message: "{0} trials cannot judge this claim with its risk and confidence; its plan takes {1}");

    public TooFewTrials() : base(TooFew)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is ClaimReading { Trials: { } trials, Needed: { } needed } && trials < needed
            ? Report(reading, needed, Numbers.Count(trials), Numbers.Count(needed))
            : null;
}
