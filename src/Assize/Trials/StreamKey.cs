using System.Buffers.Binary;
using System.Security.Cryptography;
using System.Text;

namespace Assize;

/// <summary>Which numbers a claim draws: one stream for each run seed and each claim, never shared.</summary>
static class StreamKey
{
    /// <summary>64 bits of a SHA-256 of the seed and the claim's identity: streams of different claims have nothing in common.</summary>
    public static ulong Of(ulong seed, string identity)
    {
        byte[] text = Encoding.UTF8.GetBytes(identity);
        byte[] whole = new byte[sizeof(ulong) + text.Length];
        BinaryPrimitives.WriteUInt64LittleEndian(whole, seed);
        text.CopyTo(whole, sizeof(ulong));
        return BinaryPrimitives.ReadUInt64LittleEndian(SHA256.HashData(whole));
    }
}
