using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A hand-written assertion is proven to go red on healthy code more often than the suite allows.</summary>
sealed class FlakyAssertion : Rule
{
    public const string Id = "ASZ2001";

    static readonly DiagnosticDescriptor Flaky = Describe(
        id: Id,
        severity: DiagnosticSeverity.Warning,
        title: "Assertion goes red on healthy code",
        message: "Red in at least 1 of {0} runs on healthy code ({1}); {2}; {3}");

    public FlakyAssertion() : base(Flaky)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is AssertionReading { Seeding: < Seeding.Pinned } assertion
            && assertion.FalseFailure.Lower > limits.Risk
            ? Report(
                reading,
                assertion.TrialsNeeded(limits.Risk),
                Numbers.RunsForAtLeast(assertion.FalseFailure.Lower),
                AssertionText.Asks(assertion),
                AssertionText.Cure(assertion, limits),
                AssertionText.Catches(assertion, limits))
            : null;
}
