namespace Bicycles.Flawed;

/// <summary>A shuffle with a well-known mistake: each place is swapped with any place, not with one not yet settled.</summary>
public static class SwappedRota
{
    public static int[] Draw(int bicycles, Random random)
    {
        var rota = Enumerable.Range(0, bicycles).ToArray();
        for (int place = 0; place < rota.Length; place++)
        {
            int other = random.Next(rota.Length);
            (rota[place], rota[other]) = (rota[other], rota[place]);
        }

        return rota;
    }
}
