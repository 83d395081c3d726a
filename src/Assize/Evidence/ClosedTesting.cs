namespace Assize;

/// <summary>Which members of a family are refuted each by name, at one risk for all.</summary>
/// <remarks>
/// A member is refuted when every group that contains it is: its own evidence, averaged with that of the k least others, must
/// reach the level for every k. R. Marcus, E. Peritz and K. R. Gabriel, Biometrika 63 (1976) 655, for closed testing; V. Vovk
/// and R. Wang, Ann. Statist. 49 (2021) 1736, for averages of e-values; both from memory.
/// </remarks>
static class ClosedTesting
{
    /// <summary>The members refuted, by their evidence in units of the level.</summary>
    public static IReadOnlyList<int> Refuted(IReadOnlyList<double> evidence)
    {
        int[] order = [.. Enumerable.Range(0, evidence.Count).OrderBy(member => evidence[member])];
        double[] least = new double[order.Length + 1];
        for (int k = 0; k < order.Length; k++)
            least[k + 1] = least[k] + evidence[order[k]];

        // Once a member is not refuted, none with less evidence is.
        var refuted = new List<int>();
        for (int place = order.Length - 1; place >= 0 && IsRefuted(place); place--)
            refuted.Add(order[place]);
        return refuted;

        // With the k least others: the member's own place is among the k + 1 least from there on.
        bool IsRefuted(int place)
        {
            double own = evidence[order[place]];
            for (int k = 0; k < order.Length; k++)
            {
                double sum = k <= place ? own + least[k] : least[k + 1];
                if (!(sum >= k + 1))
                    return false;
            }

            return true;
        }
    }
}
