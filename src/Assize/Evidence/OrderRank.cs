namespace Assize;

/// <summary>Numbers the orders of a few things from 0, in lexicographic order.</summary>
static class OrderRank
{
    const int MostShown = 12;

    /// <summary>The number of an order; -1 when the list is none.</summary>
    public static int Of(IReadOnlyList<int>? order, int count)
    {
        if (order is null || order.Count != count)
            return -1;

        int rank = 0, free = (1 << count) - 1;
        for (int place = 0; place < count; place++)
        {
            int thing = order[place];
            if (thing < 0 || thing >= count || (free >> thing & 1) == 0)
                return -1;

            int smaller = System.Numerics.BitOperations.PopCount((uint)free & ((1u << thing) - 1));
            rank = rank * (count - place) + smaller;
            free &= ~(1 << thing);
        }

        return rank;
    }

    /// <summary>The order of a number.</summary>
    public static int[] Unranked(int rank, int count)
    {
        int[] smaller = new int[count];
        for (int place = count - 1; place >= 0; place--)
            (rank, smaller[place]) = Math.DivRem(rank, count - place);
        var free = Enumerable.Range(0, count).ToList();
        return [.. smaller.Select(next =>
        {
            int thing = free[next];
            free.RemoveAt(next);
            return thing;
        })];
    }

    public static string Text(IReadOnlyList<int> order) =>
        $"[{string.Join(' ', order.Take(MostShown))}{(order.Count > MostShown ? " …" : "")}]";
}
