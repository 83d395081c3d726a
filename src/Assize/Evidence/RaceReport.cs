namespace Assize;

/// <summary>What a race has seen, in numbers.</summary>
sealed record RaceReport
{
    public required long Trials { get; init; }

    public required long Successes { get; init; }

    public required double Observed { get; init; }

    public required (double Lower, double Upper) Interval { get; init; }

    public required double LogEvidenceAgainstClaim { get; init; }

    public required double LogEvidenceAgainstDefectBelow { get; init; }

    public required double LogEvidenceAgainstDefectAbove { get; init; }

    public required string Theorem { get; init; }

    /// <summary>The most trials that could have been run.</summary>
    public required long Cap { get; init; }
}
