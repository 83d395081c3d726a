using System.Collections.Concurrent;

namespace Assize;

/// <summary>Numbers the claims of a process that are called alike: rows with one display name, loops, helpers.</summary>
static class Occurrences
{
    // The one state that outlives a claim: without it two like claims would draw the same numbers.
    static readonly ConcurrentDictionary<string, int> Seen = new();

    /// <summary>1 for the first claim of this name, 2 for the second …</summary>
    public static int Next(string name) => Seen.AddOrUpdate(name, 1, static (_, before) => before + 1);
}
