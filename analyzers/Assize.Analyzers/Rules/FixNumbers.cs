using System.Collections.Immutable;
using System.Globalization;
using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>What a diagnostic hands to its fix.</summary>
static class FixNumbers
{
    const string Trials = "trials";

    public static ImmutableDictionary<string, string?> Of(long? trials) => trials is { } needed
        ? ImmutableDictionary<string, string?>.Empty.Add(Trials, needed.ToString(CultureInfo.InvariantCulture))
        : ImmutableDictionary<string, string?>.Empty;

    public static long? TrialsOf(Diagnostic diagnostic) =>
        diagnostic.Properties.TryGetValue(Trials, out string? text)
        && long.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out long trials)
            ? trials
            : null;
}
