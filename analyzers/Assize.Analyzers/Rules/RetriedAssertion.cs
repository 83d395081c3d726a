using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A randomized test is retried until it is green, which hides defects as readily as chance.</summary>
sealed class RetriedAssertion : Rule
{
    public const string Id = "ASZ2006";

    static readonly DiagnosticDescriptor Retried = Describe(
        id: Id,
        severity: DiagnosticSeverity.Warning,
        title: "Retries let defects pass",
        message: "Green if any of {0} tries is: a defect that one try catches with probability 0.5 is caught with probability {1} by all, "
            + "and healthy code is red in at most 1 of {2} runs ({3}); {4}");

    public RetriedAssertion() : base(Retried)
    {
    }

    // The tries draw anew, so all of them are red with the product of their probabilities.
    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is AssertionReading { Runs.Tries: > 1 } assertion
            ? Report(
                reading,
                null,
                Numbers.Count(assertion.Runs.Tries),
                Numbers.Share(Math.Pow(0.5, assertion.Runs.Tries)),
                Numbers.RunsForAtMost(assertion.FalseFailure.Upper),
                AssertionText.Asks(assertion),
                Cure(assertion with { Runs = Runs.Once }, limits))
            : null;

    static string Cure(AssertionReading once, Limits limits) => once.TrialsNeeded(limits.Risk) is { } trials
        ? $"one try of {Numbers.Count(trials)} trials is red at most once in {Numbers.RunsForAtMost(limits.Risk)} runs"
        : "one try and a wider band, or a claim, needs no retry";
}
