namespace Assize.Cli;

/// <summary>The claims of one run against the budget for false failures.</summary>
sealed class Tally
{
    public Tally(IReadOnlyList<LedgerEntry> entries, double budget)
    {
        Entries = entries;
        Budget = budget;
        foreach (var entry in entries)
        {
            // Each sum is rounded up: a suite's risk must never look smaller than it is.
            FalseFailure = Math.Min(1, Math.BitIncrement(FalseFailure + entry.Risk));
            Trials += entry.Trials;
        }
    }

    public IReadOnlyList<LedgerEntry> Entries { get; }

    /// <summary>The probability allowed that a healthy suite goes red in one run.</summary>
    public double Budget { get; }

    /// <summary>At most this likely does a healthy suite go red in one run: the sum of the risks (union bound), in [0, 1].</summary>
    public double FalseFailure { get; }

    public long Trials { get; }

    public bool WithinBudget => FalseFailure <= Budget;

    public IEnumerable<LedgerEntry> With(Outcome verdict) => Entries.Where(entry => entry.Verdict == verdict);

    public int Count(Outcome verdict) => With(verdict).Count();
}
