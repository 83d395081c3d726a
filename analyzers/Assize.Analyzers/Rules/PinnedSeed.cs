using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A fixed seed keeps an assertion quiet that would be red on many other seeds although the code is right.</summary>
sealed class PinnedSeed : Rule
{
    public const string Id = "ASZ2004";

    static readonly DiagnosticDescriptor Pinned = Describe(
        id: Id,
        severity: DiagnosticSeverity.Info,
        title: "A fixed seed hides how often the assertion is red",
        message: "On healthy code at least {0} of 100 seeds are red ({1}), and any change to the draws picks another; {2}; {3}");

    public PinnedSeed() : base(Pinned)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is AssertionReading { Seeding: Seeding.Pinned } assertion && assertion.FalseFailure.Lower > limits.Risk
            ? Report(
                reading,
                assertion.TrialsNeeded(limits.Risk),
                Numbers.ShareBelow(100 * assertion.FalseFailure.Lower),
                AssertionText.Asks(assertion),
                AssertionText.Cure(assertion, limits),
                AssertionText.Catches(assertion, limits))
            : null;
}
