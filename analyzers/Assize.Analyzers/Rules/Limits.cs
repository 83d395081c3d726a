using System.Globalization;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Analyzers;

/// <summary>What a suite allows, from `.editorconfig`; a setting that is no such number leaves the default.</summary>
/// <param name="Risk">`assize.risk_limit`: false failures allowed to one assertion in one run, in [1e-300, 1).</param>
/// <param name="Confidence">`assize.confidence`: how surely a defect counts as caught, in (0, 1).</param>
/// <param name="Trials">`assize.trial_limit`: trials allowed to one claim, at least 1.</param>
sealed record Limits(double Risk, double Confidence, long Trials)
{
    public static Limits Default { get; } = new(1e-6, 0.999, 10_000_000);

    public static Limits From(AnalyzerConfigOptions options) => new(
        Number(options, "assize.risk_limit", 1e-300) ?? Default.Risk,
        Number(options, "assize.confidence", double.Epsilon) ?? Default.Confidence,
        Whole(options, "assize.trial_limit") ?? Default.Trials);

    static long? Whole(AnalyzerConfigOptions options, string key) =>
        options.TryGetValue(key, out string? text)
        && long.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out long number) && number > 0
            ? number
            : null;

    static double? Number(AnalyzerConfigOptions options, string key, double least) =>
        options.TryGetValue(key, out string? text)
        && double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double number)
        && number >= least && number < 1
            ? number
            : null;
}
