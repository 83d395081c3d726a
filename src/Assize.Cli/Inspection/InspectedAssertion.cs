using Assize.Bounds;

namespace Assize.Cli;

/// <summary>One hand-written randomized assertion as a report shows it; band, target and defect in the unit of its statistic.</summary>
sealed record InspectedAssertion(Place Place)
{
    public required string Framework { get; init; }

    /// <summary>How the source comes to the statistic.</summary>
    public required string Shape { get; init; }

    public required string Statistic { get; init; }

    public long? Trials { get; init; }

    public double? AcceptedLow { get; init; }

    public double? AcceptedHigh { get; init; }

    public double? Target { get; init; }

    /// <summary>Where the randomness begins.</summary>
    public required string Seed { get; init; }

    /// <summary>Probability of red in one run on healthy code; null where nothing bounds it.</summary>
    public Enclosure? FalseFailure { get; init; }

    public double? SmallestDefectCaught { get; init; }

    public long? TrialsNeeded { get; init; }

    /// <summary>The theorem that decided.</summary>
    public string? Theorem { get; init; }

    public required IReadOnlyList<InspectedFinding> Findings { get; init; }

    /// <summary>Every run draws the same: red now or never, so no chance of a run is added up.</summary>
    public bool IsPinned => Seed == "pinned";

    public bool Has(string rule) => Findings.Any(finding => finding.Rule == rule);
}
