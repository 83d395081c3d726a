using System.Globalization;
using Assize.Bounds;

namespace Assize;

/// <summary>Everything it takes to run one trial again, alone: the stream, the trial, and the runtime whose methods drew from it.</summary>
/// <param name="Stream">The key of the claim's stream.</param>
/// <param name="Trial">The trial, counted from 1.</param>
/// <param name="Runtime">The major version of the runtime.</param>
sealed record ReplayKey(ulong Stream, long Trial, int Runtime)
{
    public static ReplayKey Of(ulong stream, long trial) => new(stream, trial, Environment.Version.Major);

    public override string ToString() =>
        string.Create(CultureInfo.InvariantCulture, $"{Stream:x16}-{Trial}-net{Runtime}");

    public static ReplayKey Parse(string text)
    {
        string[] parts = text.Split('-');
        return parts.Length == 3
            && ulong.TryParse(parts[0], NumberStyles.AllowHexSpecifier, CultureInfo.InvariantCulture, out ulong stream)
            && long.TryParse(parts[1], NumberStyles.None, CultureInfo.InvariantCulture, out long trial) && trial > 0
            && parts[2].StartsWith("net", StringComparison.Ordinal)
            && int.TryParse(parts[2].AsSpan(3), NumberStyles.None, CultureInfo.InvariantCulture, out int runtime)
                ? new ReplayKey(stream, trial, runtime)
                : throw new ClaimRefusedException($"'{text}' is no replay key. Copy it whole from the failure text, for example 00c0ffee00c0ffee-17-net10.");
    }
}
