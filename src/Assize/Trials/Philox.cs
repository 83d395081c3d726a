using System.Runtime.CompilerServices;

namespace Assize;

/// <summary>A generator without state: four 32-bit words for each key and counter.</summary>
/// <remarks>Philox4x32-10: J. K. Salmon, M. A. Moraes, R. O. Dror and D. E. Shaw, SC11 (2011), §4.</remarks>
static class Philox
{
    const uint MultiplierA = 0xD2511F53;
    const uint MultiplierB = 0xCD9E8D57;
    const uint WeylA = 0x9E3779B9;
    const uint WeylB = 0xBB67AE85;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static (uint, uint, uint, uint) Block(ulong key, ulong high, ulong low)
    {
        uint c0 = (uint)low, c1 = (uint)(low >> 32), c2 = (uint)high, c3 = (uint)(high >> 32);
        uint k0 = (uint)key, k1 = (uint)(key >> 32);
        for (int round = 0; round < 10; round++)
        {
            ulong a = (ulong)MultiplierA * c0;
            ulong b = (ulong)MultiplierB * c2;
            (c0, c1, c2, c3) = ((uint)(b >> 32) ^ c1 ^ k0, (uint)b, (uint)(a >> 32) ^ c3 ^ k1, (uint)a);
            k0 += WeylA;
            k1 += WeylB;
        }

        return (c0, c1, c2, c3);
    }
}
