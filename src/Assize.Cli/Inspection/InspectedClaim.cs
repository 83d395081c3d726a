namespace Assize.Cli;

/// <summary>One claim of the kit as a report shows it.</summary>
sealed record InspectedClaim(Place Place, string Text, long? Trials, long? TrialsNeeded, IReadOnlyList<InspectedFinding> Findings);
