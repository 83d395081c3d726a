namespace Assize.Cli;

/// <summary>Everything a run found out.</summary>
sealed record RunResult(Tally Tally, int TornLines, IReadOnlyList<Finding> Findings, IReadOnlyList<string> RedProjects)
{
    public ExitCode Exit =>
        RedProjects.Count > 0 ? ExitCode.Red
        : !Tally.WithinBudget || Findings.Any(finding => finding.Stands) ? ExitCode.NotKept
        : ExitCode.Kept;
}
