using System.Text.Json;
using System.Text.Json.Serialization;

namespace Assize;

/// <summary>One claim judged in one run: one line of a ledger.</summary>
public sealed record LedgerEntry
{
    /// <summary>The version of the format this library writes.</summary>
    public const int CurrentSchema = 1;

    /// <summary>The version of the format.</summary>
    public required int Schema { get; init; }

    /// <summary>Names the process that judged the claim.</summary>
    public required string Run { get; init; }

    /// <summary>The seed of the run, 16 hexadecimal digits.</summary>
    public required string Seed { get; init; }

    /// <summary>The key of the claim's stream, 16 hexadecimal digits: with the seed, it names the draws.</summary>
    public required string Stream { get; init; }

    /// <summary>The assembly of the test.</summary>
    public required string Assembly { get; init; }

    /// <summary>The test with its data row.</summary>
    public required string Test { get; init; }

    /// <summary>What stays the same when data rows are reordered: the name given by the author, or the test and the claim.</summary>
    public required string History { get; init; }

    /// <summary>What was claimed, in words.</summary>
    public required string Claim { get; init; }

    /// <summary>The kind of claim: "rate", "mean", …</summary>
    public required string Family { get; init; }

    /// <summary>The value claimed; null when the claim is about many values.</summary>
    public double? Target { get; init; }

    /// <summary>How far from the target is still right.</summary>
    public required double Tolerance { get; init; }

    /// <summary>How far from the target is caught.</summary>
    public required double Defect { get; init; }

    /// <summary>From here downwards it is caught; null when there is nothing to catch below.</summary>
    public double? LowerDefect { get; init; }

    /// <summary>The least value that is right; null when none is too low.</summary>
    public double? LowerEdge { get; init; }

    /// <summary>The greatest value that is right; null when none is too high.</summary>
    public double? UpperEdge { get; init; }

    /// <summary>From here upwards it is caught; null when there is nothing to catch above.</summary>
    public double? UpperDefect { get; init; }

    /// <summary>The probability of a false failure allowed.</summary>
    public required double Risk { get; init; }

    /// <summary>One minus the probability of a missed defect allowed.</summary>
    public required double Confidence { get; init; }

    /// <summary>Trials the verdict rests on.</summary>
    public required long Trials { get; init; }

    /// <summary>Successes among them, where draws are judged by one count: with the trials, all that a later look at
    /// the history needs; else null.</summary>
    public long? Successes { get; init; }

    /// <summary>What else a later look at the history needs, by name; null where the successes are
    /// enough.</summary>
    public IReadOnlyDictionary<string, double>? Counts { get; init; }

    /// <summary>The most trials that could have been run.</summary>
    public required long Cap { get; init; }

    /// <summary>The value observed; null without a trial.</summary>
    public double? Observed { get; init; }

    /// <summary>The lower end of the interval for the true value; null when it has none.</summary>
    public double? IntervalLower { get; init; }

    /// <summary>The upper end of the interval for the true value; null when it has none.</summary>
    public double? IntervalUpper { get; init; }

    /// <summary>Natural logarithm of the evidence against the claim.</summary>
    public required double LogEvidenceAgainstClaim { get; init; }

    /// <summary>Natural logarithm of the evidence against a defect below; null when there is none to catch.</summary>
    public double? LogEvidenceAgainstDefectBelow { get; init; }

    /// <summary>Natural logarithm of the evidence against a defect above; null when there is none to catch.</summary>
    public double? LogEvidenceAgainstDefectAbove { get; init; }

    /// <summary>The verdict.</summary>
    public required Outcome Verdict { get; init; }

    /// <summary>The theorem that decided.</summary>
    public required string Theorem { get; init; }

    /// <summary>How long the trials took, in seconds.</summary>
    public required double Seconds { get; init; }

    /// <summary>The source file that judged the claim.</summary>
    public required string File { get; init; }

    /// <summary>The line in it, counted from 1.</summary>
    public required int Line { get; init; }

    /// <summary>Whether the seed brings the draws back.</summary>
    public required bool Replayable { get; init; }

    /// <summary>Whether the verdict rests on an approximation; no claim of this version does.</summary>
    public required bool Approximate { get; init; }

    /// <summary>Fields that a later version added: kept, not understood.</summary>
    [JsonExtensionData]
    public Dictionary<string, JsonElement>? Unknown { get; set; }
}
