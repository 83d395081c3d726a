using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;

namespace Assize;

/// <summary>A generator without state: four 32-bit words for each key and counter.</summary>
/// <remarks>Philox4x32-10: J. K. Salmon, M. A. Moraes, R. O. Dror and D. E. Shaw, SC11 (2011), §4.</remarks>
static class Philox
{
    const uint MultiplierA = 0xD2511F53;
    const uint MultiplierB = 0xCD9E8D57;
    const uint WeylA = 0x9E3779B9;
    const uint WeylB = 0xBB67AE85;
    const int Rounds = 10;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static (uint, uint, uint, uint) Block(ulong key, ulong high, ulong low)
    {
        uint c0 = (uint)low, c1 = (uint)(low >> 32), c2 = (uint)high, c3 = (uint)(high >> 32);
        uint k0 = (uint)key, k1 = (uint)(key >> 32);
        for (int round = 0; round < Rounds; round++)
        {
            ulong a = (ulong)MultiplierA * c0;
            ulong b = (ulong)MultiplierB * c2;
            (c0, c1, c2, c3) = ((uint)(b >> 32) ^ c1 ^ k0, (uint)b, (uint)(a >> 32) ^ c3 ^ k1, (uint)a);
            k0 += WeylA;
            k1 += WeylB;
        }

        return (c0, c1, c2, c3);
    }

    /// <summary>The first blocks of consecutive trials, 1, 2 or 4 of each: two 64-bit words a block.</summary>
    public static void FillTrials(ulong key, ulong trial, int each, Span<ulong> words)
    {
        var (share, step) = ((ulong)each, (ulong)(4 / each));
        var high = Vector256.Create(trial, trial + 1 / share, trial + 2 / share, trial + 3 / share);
        var low = Vector256.Create(0, 1 % share, 2 % share, 3 % share);
        int done = FillEights(key, high, low, Vector256.Create(step), Vector256<ulong>.Zero, words);
        for (ulong i = (ulong)done / 2; i < (ulong)words.Length / 2; i++)
            Put(Block(key, trial + i / share, i % share), words, i);
    }

    /// <summary>Consecutive blocks of one trial: two 64-bit words each.</summary>
    public static void FillBlocks(ulong key, ulong trial, ulong block, Span<ulong> words)
    {
        var low = Vector256.Create(block, block + 1, block + 2, block + 3);
        int done = FillEights(key, Vector256.Create(trial), low, Vector256<ulong>.Zero, Vector256.Create(4UL), words);
        for (ulong i = (ulong)done / 2; i < (ulong)words.Length / 2; i++)
            Put(Block(key, trial, block + i), words, i);
    }

    static void Put((uint A, uint B, uint C, uint D) block, Span<ulong> words, ulong place) =>
        (words[(int)(2 * place)], words[(int)(2 * place + 1)]) =
            ((ulong)block.B << 32 | block.A, (ulong)block.D << 32 | block.C);

    // As far as whole eights of blocks go; none where the processor has no such multiplication.
    static int FillEights(ulong key, Vector256<ulong> high, Vector256<ulong> low,
        Vector256<ulong> highStep, Vector256<ulong> lowStep, Span<ulong> words)
    {
        int done = 0;
        for (; Avx2.IsSupported && words.Length - done >= 16; done += 16)
        {
            Eight(key, high, low, high + highStep, low + lowStep, words[done..]);
            high += highStep + highStep;
            low += lowStep + lowStep;
        }

        return done;
    }

    // One 32-bit word in each 64-bit lane, its upper half ignored; two chains, since one waits for its own products.
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    static void Eight(ulong key, Vector256<ulong> high, Vector256<ulong> low,
        Vector256<ulong> nextHigh, Vector256<ulong> nextLow, Span<ulong> words)
    {
        var (a, b, c, d) = (low, low >> 32, high, high >> 32);
        var (e, f, g, h) = (nextLow, nextLow >> 32, nextHigh, nextHigh >> 32);
        var (mulA, mulB) = (Vector256.Create((ulong)MultiplierA), Vector256.Create((ulong)MultiplierB));
        uint k0 = (uint)key, k1 = (uint)(key >> 32);
        for (int round = 0; round < Rounds; round++)
        {
            var (keyA, keyB) = (Vector256.Create((ulong)k0), Vector256.Create((ulong)k1));
            var (productA, productB) = (Multiply(a, mulA), Multiply(c, mulB));
            (a, b, c, d) = ((productB >> 32) ^ b ^ keyA, productB, (productA >> 32) ^ d ^ keyB, productA);
            (productA, productB) = (Multiply(e, mulA), Multiply(g, mulB));
            (e, f, g, h) = ((productB >> 32) ^ f ^ keyA, productB, (productA >> 32) ^ h ^ keyB, productA);
            k0 += WeylA;
            k1 += WeylB;
        }

        Store(a, b, c, d, words);
        Store(e, f, g, h, words[8..]);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    static Vector256<ulong> Multiply(Vector256<ulong> x, Vector256<ulong> y) => Avx2.Multiply(x.AsUInt32(), y.AsUInt32());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    static void Store(
        Vector256<ulong> a, Vector256<ulong> b, Vector256<ulong> c, Vector256<ulong> d, Span<ulong> words)
    {
        var half = Vector256.Create((ulong)uint.MaxValue);
        var (first, second) = ((a & half) | (b << 32), (c & half) | (d << 32));
        var (even, odd) = (Avx2.UnpackLow(first, second), Avx2.UnpackHigh(first, second));
        Avx2.Permute2x128(even, odd, 0x20).CopyTo(words);
        Avx2.Permute2x128(even, odd, 0x31).CopyTo(words[4..]);
    }
}
