namespace Assize.Cli;

/// <summary>Everything an inspection found.</summary>
/// <param name="Root">The folder that places are told from.</param>
/// <param name="ReadFrom">How the sources were read: through a build, or as plain sources with signatures of the frameworks.</param>
/// <param name="Notes">What a reader of the report must know, for example files that were left out.</param>
/// <param name="Assertions">Worst first.</param>
/// <param name="Claims">Claims of the kit, by place.</param>
/// <param name="Budget">The probability allowed to the whole suite; null when none was given.</param>
sealed record Inspected(
    string Root,
    string ReadFrom,
    IReadOnlyList<string> Notes,
    IReadOnlyList<InspectedAssertion> Assertions,
    IReadOnlyList<InspectedClaim> Claims,
    double? Budget)
{
    const double Rounding = 1e-12;

    public int Assessed => Assertions.Count(assertion => assertion.FalseFailure is not null);

    public int Flaky => Assertions.Count(assertion => assertion.Has("ASZ2001"));

    public int Toothless => Assertions.Count(assertion => assertion.Has("ASZ2003"));

    public int Pinned => Assertions.Count(assertion => assertion.IsPinned);

    /// <summary>Assertions whose chance of red nothing bounds; they are in no sum.</summary>
    public int Unbounded => Assertions.Count(assertion => assertion is { FalseFailure: null, IsPinned: false });

    /// <summary>At most this likely is a healthy suite red in one run by the assertions that are bounded: their sum (union bound), in [0, 1].</summary>
    public double FalseFailureUpper { get; } = Math.Min(1, (1 + Rounding) * Assertions
        .Where(assertion => !assertion.IsPinned).Sum(assertion => assertion.FalseFailure?.Upper ?? 0));

    public IEnumerable<(Place Place, InspectedFinding Finding)> Findings =>
        Assertions.SelectMany(assertion => assertion.Findings.Select(finding => (assertion.Place, finding)))
            .Concat(Claims.SelectMany(claim => claim.Findings.Select(finding => (claim.Place, finding))));

    public bool WithinBudget => Budget is not { } allowed || FalseFailureUpper <= allowed;

    public ExitCode Exit => WithinBudget && !Findings.Any(found => found.Finding.Stands) ? ExitCode.Kept : ExitCode.NotKept;

    /// <summary>The path of a place as reports write it: from the root, with forward slashes.</summary>
    public string Relative(Place place) => Path.GetRelativePath(Root, place.File).Replace('\\', '/');
}
