using System.Collections.Concurrent;
using System.Runtime.CompilerServices;

namespace Assize;

/// <summary>Names for the claims of a run: two rows, two loops, two assemblies never share one, and a second run finds the same again.</summary>
static class Identities
{
    // Occurrences are counted within one run of one test; without a framework, within the process.
    static readonly ConditionalWeakTable<object, ConcurrentDictionary<string, int>> Seen = [];
    static readonly object Process = new();

    public static string Of(Claim claim, Site site, HostContext host)
    {
        string place = claim.Name ?? $"{host.Assembly}|{host.Test}|{claim.Sentence}";
        var counts = Seen.GetValue(host.Occasion ?? Process, static _ => new());
        int occurrence = counts.AddOrUpdate(place, 1, static (_, before) => before + 1);
        return $"{place}|{occurrence}";
    }
}
