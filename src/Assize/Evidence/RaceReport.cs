namespace Assize;

/// <summary>What a race has seen, in numbers.</summary>
sealed record RaceReport
{
    public required long Trials { get; init; }

    public required long Successes { get; init; }

    public required double Observed { get; init; }

    public required (double Lower, double Upper) Interval { get; init; }

    public required double LogEvidenceAgainstClaim { get; init; }

    /// <summary>Null when there is no such defect.</summary>
    public required double? LogEvidenceAgainstDefectBelow { get; init; }

    /// <summary>Null when there is no such defect.</summary>
    public required double? LogEvidenceAgainstDefectAbove { get; init; }

    /// <summary>The probability of a missed defect allowed.</summary>
    public required double Miss { get; init; }

    public required string Theorem { get; init; }

    /// <summary>The most trials that could have been run.</summary>
    public required long Cap { get; init; }

    /// <summary>The counts that uphold the claim, where the count at the last trial decided; else null.</summary>
    public (long Low, long High)? Accepts { get; init; }
}
