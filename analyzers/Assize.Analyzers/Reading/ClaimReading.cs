using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A claim of the kit with constant numbers.</summary>
/// <param name="Location">Where it would be reported: the trials given, or the whole claim.</param>
/// <param name="TrialsLiteral">The one literal that sets the number of trials; null when there is no such
/// literal.</param>
/// <param name="Trials">The trials it is given; null when it is given none.</param>
/// <param name="Needed">The trials of its plan; null when the claim is refused.</param>
/// <param name="Refusal">Why its numbers cannot be met; null when they can.</param>
sealed record ClaimReading(Location Location, Location? TrialsLiteral, long? Trials, long? Needed, string? Refusal)
    : Reading(Location, TrialsLiteral);
