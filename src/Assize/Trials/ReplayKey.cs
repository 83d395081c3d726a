using System.Globalization;
using Assize.Bounds;

namespace Assize;

/// <summary>Everything it takes to run one trial again, alone.</summary>
/// <param name="Seed">The seed of the run.</param>
/// <param name="Stream">The key of the claim's stream.</param>
/// <param name="Trial">The trial, counted from 1.</param>
/// <param name="Runtime">The runtime's major version: some of its methods draw from the stream in their own way.</param>
sealed record ReplayKey(ulong Seed, ulong Stream, long Trial, int Runtime)
{
    public static ReplayKey Of(ulong seed, ulong stream, long trial) => new(seed, stream, trial, Environment.Version.Major);

    public override string ToString() =>
        string.Create(CultureInfo.InvariantCulture, $"{Seed:x16}-{Stream:x16}-{Trial}-net{Runtime}");

    public static ReplayKey Parse(string text) =>
        text.Split('-') is [{ Length: 16 } seed, { Length: 16 } stream, var trial, ['n', 'e', 't', .. var runtime]]
            && Hexadecimal(seed) is { } seedValue
            && Hexadecimal(stream) is { } streamValue
            && long.TryParse(trial, NumberStyles.None, CultureInfo.InvariantCulture, out long number) && number > 0
            && int.TryParse(runtime, NumberStyles.None, CultureInfo.InvariantCulture, out int version)
                ? new ReplayKey(seedValue, streamValue, number, version)
                : throw new ClaimRefusedException($"'{text}' is no replay key. Copy it whole from the failure text; "
                    + "it looks like 00c0ffee00c0ffee-0123456789abcdef-17-net10.");

    static ulong? Hexadecimal(string text) =>
        ulong.TryParse(text, NumberStyles.AllowHexSpecifier, CultureInfo.InvariantCulture, out ulong value) ? value : null;
}
