using System.Globalization;
using System.Security.Cryptography;
using Assize.Bounds;

namespace Assize;

/// <summary>The seed of a run: fresh for each process, or the one that ASSIZE_SEED or the suite names.</summary>
static class RunSeed
{
    public const string Variable = "ASSIZE_SEED";

    static readonly ulong Fresh = BitConverter.ToUInt64(RandomNumberGenerator.GetBytes(sizeof(ulong)));

    public static ulong Current => Environment.GetEnvironmentVariable(Variable) is { Length: > 0 } text ? Parse(text)
        : SuiteTerms.Seed is { Length: > 0 } declared ? Parse(declared, "The Seed of SuiteTerms")
        : Fresh;

    public static string Text(ulong seed) => seed.ToString("x16", CultureInfo.InvariantCulture);

    public static ulong Parse(string text, string source = Variable) =>
        ulong.TryParse(text, NumberStyles.AllowHexSpecifier, CultureInfo.InvariantCulture, out ulong seed)
            ? seed
            : throw new ClaimRefusedException(
                $"{source} is '{text}'; it must be 1 to 16 hexadecimal digits, as a failure text prints them. Unset it for a fresh seed.");
}
