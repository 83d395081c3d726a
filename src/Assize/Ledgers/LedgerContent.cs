namespace Assize;

/// <summary>What ledgers hold.</summary>
/// <param name="Entries">The claims judged, file by file in the order they were written.</param>
/// <param name="TornLines">Last lines without an end: a process ended while it wrote, and those claims are not counted.</param>
public sealed record LedgerContent(IReadOnlyList<LedgerEntry> Entries, int TornLines);
