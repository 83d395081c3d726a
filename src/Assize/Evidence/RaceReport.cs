namespace Assize;

/// <summary>What a race has seen, in numbers.</summary>
sealed record RaceReport
{
    public required long Trials { get; init; }

    /// <summary>The trial that settled it, where that is not the last one counted.</summary>
    public long? LastTrial { get; init; }

    /// <summary>The value observed, of the quantity claimed; NaN without a trial.</summary>
    public required double Observed { get; init; }

    /// <summary>What was observed, in words; null when the number says it all.</summary>
    public string? Seen { get; init; }

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

    /// <summary>What upholds the claim, where the draws at the last trial decided: "7,400 to 7,600 successes"; else
    /// null.</summary>
    public string? Accepts { get; init; }

    /// <summary>The fact that a draw, or all of them, contradict, in words; else null.</summary>
    public string? Contradiction { get; init; }

    /// <summary>More rows for the text: the categories that are off, the members that are refuted.</summary>
    public IReadOnlyList<(string Label, string Content)> Details { get; init; } = [];

    /// <summary>Successes, where draws are judged by one count.</summary>
    public long? Successes { get; init; }

    /// <summary>With the trials, all that a later look at the history needs, by name.</summary>
    public IReadOnlyDictionary<string, double>? Counts { get; init; }
}
