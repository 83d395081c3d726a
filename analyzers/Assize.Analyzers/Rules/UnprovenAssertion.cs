using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>
/// A hand-written assertion is neither proven to be red more often than the suite allows, nor proven not to be.
/// </summary>
sealed class UnprovenAssertion : Rule
{
    public const string Id = "ASZ2002";

    static readonly DiagnosticDescriptor Unproven = Describe(
        id: Id,
        severity: DiagnosticSeverity.Info,
        title: "Assertion is not proven to stay green on healthy code",
        message: "Red in at most 1 of {0} runs on healthy code ({1}), which is not within the limit of 1 in {2}; {3}; {4}");

    public UnprovenAssertion() : base(Unproven)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is AssertionReading { Seeding: < Seeding.Pinned } assertion
        && assertion.FalseFailure.Lower <= limits.Risk && assertion.FalseFailure.Upper > limits.Risk
            ? Report(
                reading,
                assertion.TrialsNeeded(limits.Risk),
                Numbers.RunsForAtMost(assertion.FalseFailure.Upper),
                AssertionText.Asks(assertion),
                Numbers.RunsForAtMost(limits.Risk),
                AssertionText.Cure(assertion, limits),
                AssertionText.Catches(assertion, limits))
            : null;
}
