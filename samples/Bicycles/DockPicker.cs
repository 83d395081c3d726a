namespace Bicycles;

/// <summary>Sends a returning rider to a dock: the more free places a dock has, the more often it is picked.</summary>
public sealed class DockPicker
{
    readonly string[] docks;
    readonly int[] freeUpTo;

    public DockPicker(params (string Dock, int Free)[] docks)
    {
        this.docks = [.. docks.Select(entry => entry.Dock)];
        freeUpTo = new int[docks.Length];
        int sum = 0;
        for (int i = 0; i < docks.Length; i++)
            freeUpTo[i] = sum += docks[i].Free;
        ArgumentOutOfRangeException.ThrowIfZero(sum, nameof(docks));
    }

    public string Pick(Random random)
    {
        int place = random.Next(freeUpTo[^1]);
        return docks[Array.FindIndex(freeUpTo, upTo => place < upTo)];
    }
}
