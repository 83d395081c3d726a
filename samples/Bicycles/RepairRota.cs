namespace Bicycles;

/// <summary>The order in which the workshop takes the bicycles in: every order is equally likely, so that nobody is always last.</summary>
public static class RepairRota
{
    public static int[] Draw(int bicycles, Random random)
    {
        var rota = Enumerable.Range(0, bicycles).ToArray();
        for (int last = rota.Length - 1; last > 0; last--)
        {
            int other = random.Next(last + 1);
            (rota[last], rota[other]) = (rota[other], rota[last]);
        }

        return rota;
    }
}
