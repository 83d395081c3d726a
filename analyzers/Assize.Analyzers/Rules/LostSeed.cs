using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>The draws of a hand-written assertion begin at a seed that nobody knows: a red run cannot be replayed.</summary>
sealed class LostSeed : Rule
{
    public const string Id = "ASZ2005";

    static readonly DiagnosticDescriptor Lost = Describe(
        id: Id,
        severity: DiagnosticSeverity.Info,
        title: "A red run cannot be replayed",
        message: "The draws come from {0}, whose seed no report can name: when this is red, its {1} trials cannot be drawn again");

    public LostSeed() : base(Lost)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits) =>
        reading is AssertionReading assertion && Source(assertion.Seeding) is { } source
            ? Report(reading, null, source, Numbers.Count(assertion.Trials))
            : null;

    static string? Source(Seeding seeding) => seeding switch
    {
        Seeding.Fresh => "a generator made without a seed",
        Seeding.Shared => "the generator shared by the process",
        Seeding.Cryptographic => "a cryptographic generator",
        _ => null,
    };
}
