namespace Assize.Cli;

/// <summary>What ledgers add up to.</summary>
sealed record TallyResult(Tally Tally, int TornLines, int Files)
{
    public ExitCode Exit =>
        Tally.Count(Outcome.Upheld) < Tally.Entries.Count ? ExitCode.Red
        : Tally.WithinBudget ? ExitCode.Kept
        : ExitCode.NotKept;

    /// <summary>What each test spends, the greatest first.</summary>
    public IReadOnlyList<Spending> Spent { get; } =
    [
        .. Tally.Entries.GroupBy(entry => (entry.Assembly, entry.Test))
            .Select(group => new Spending(
                group.Key.Assembly, group.Key.Test, group.Count(), new Tally([.. group], Tally.Budget).FalseFailure, group.Sum(entry => entry.Trials)))
            .OrderByDescending(spending => spending.Risk)
            .ThenBy(spending => spending.Assembly, StringComparer.Ordinal)
            .ThenBy(spending => spending.Test, StringComparer.Ordinal),
    ];
}
