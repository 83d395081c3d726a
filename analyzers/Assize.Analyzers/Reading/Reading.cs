using System.Collections.Immutable;
using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>What was read at one place: plain data for rules, fixes and reports.</summary>
/// <param name="Location">Where it would be reported.</param>
/// <param name="TrialsLiteral">The one literal that sets the number of trials; null when there is no such
/// literal.</param>
abstract record Reading(Location Location, Location? TrialsLiteral)
{
    public ImmutableArray<Location> FixLocations => TrialsLiteral is null ? [] : [TrialsLiteral];
}
