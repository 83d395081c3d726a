namespace Assize;

/// <summary>How a claim is to be judged, whatever it claims.</summary>
sealed record Terms
{
    public double Risk { get; init; } = SuiteTerms.Risk;

    public double Confidence { get; init; } = SuiteTerms.Confidence;

    public long? Trials { get; init; }

    public long? TrialCap { get; init; }

    public TimeSpan? TimeCap { get; init; }

    public bool MayStayUndecided { get; init; }

    public int Threads { get; init; } = 1;

    public string? Name { get; init; }

    public ReplayKey? OnlyTrial { get; init; }

    public CancellationToken Stop { get; init; }

    public Action<string>? Output { get; init; }
}
