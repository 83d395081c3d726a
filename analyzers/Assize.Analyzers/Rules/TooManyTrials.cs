using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A claim of the kit needs more trials than the suite allows to one claim.</summary>
sealed class TooManyTrials : Rule
{
    public const string Id = "ASZ1006";

    static readonly DiagnosticDescriptor TooMany = Describe(
        id: Id,
        severity: DiagnosticSeverity.Info,
        title: "The claim needs more trials than the limit",
        message: "The plan of this claim takes {0} trials, more than the limit of {1}; a wider gap between tolerance and defect needs fewer");

    public TooManyTrials() : base(TooMany)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is ClaimReading { Needed: { } needed } && needed > limits.Trials
            ? Report(reading, null, Numbers.Count(needed), Numbers.Count(limits.Trials))
            : null;
}
