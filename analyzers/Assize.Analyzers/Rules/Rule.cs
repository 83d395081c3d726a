using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>
/// One rule: a judgement of a reading. Found by reflection; <see cref="RandomizedTests"/> hosts them all.
/// </summary>
abstract class Rule
{
    protected Rule(DiagnosticDescriptor descriptor) => Descriptor = descriptor;

    public DiagnosticDescriptor Descriptor { get; }

    /// <summary>What the rule says of a reading; null when there is nothing to say.</summary>
    public abstract Diagnostic? Judge(Reading reading, Limits limits);

    // Release tracking sees a descriptor only through a static field and a helper whose first parameter is called id.
    protected static DiagnosticDescriptor Describe(
        string id, DiagnosticSeverity severity, string title, string message) =>
        new(id, title, message, "Trials", severity, isEnabledByDefault: true);

    protected Diagnostic Report(Reading reading, long? trials, params object[] arguments) => Diagnostic.Create(
        Descriptor, reading.Location, reading.FixLocations, FixNumbers.Of(trials), arguments);
}
