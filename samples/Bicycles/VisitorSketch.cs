using System.Numerics;

namespace Bicycles;

/// <summary>
/// Estimates how many different riders passed a dock in a few hundred bytes: each of the registers keeps the smallest
/// hash it has seen, and the harmonic sum of the smallest ones tells how many there were.
/// </summary>
public sealed class VisitorSketch(int registers, ulong salt)
{
    readonly double[] smallest = [.. Enumerable.Repeat(1.0, registers)];

    public void See(ulong rider)
    {
        ulong hash = Mix(rider ^ salt);
        int register = (int)(hash % (ulong)registers);
        double height = (Mix(hash) >> 11) * (1.0 / (1UL << 53));
        smallest[register] = Math.Min(smallest[register], height);
    }

    /// <summary>Unbiased when riders greatly outnumber registers: the minima are then close to exponential.</summary>
    public double Estimate() => (registers - 1) * registers / smallest.Sum();

    // A published finaliser of 64-bit hashes: two multiply-xorshift rounds spread every input bit over all output bits.
    static ulong Mix(ulong value)
    {
        value = (value ^ (value >> 30)) * 0xBF58476D1CE4E5B9;
        value = (value ^ (value >> 27)) * 0x94D049BB133111EB;
        return BitOperations.RotateLeft(value ^ (value >> 31), 17);
    }
}
