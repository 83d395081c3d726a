namespace Assize.Cli;

/// <summary>The claims of one run against the budget for false failures.</summary>
sealed class Tally
{
    // A decimal adds up what people write without rounding; what is too small for it counts as this much.
    const decimal Least = 1e-25m;

    public Tally(IReadOnlyList<LedgerEntry> entries, double budget)
    {
        (Entries, Budget) = (entries, budget);
        Trials = entries.Sum(entry => entry.Trials);
        FalseFailure = (double)Math.Min(1, entries.Sum(entry => Math.Max(Least, (decimal)entry.Risk)));
    }

    public IReadOnlyList<LedgerEntry> Entries { get; }

    /// <summary>The probability allowed that a healthy suite goes red in one run.</summary>
    public double Budget { get; }

    /// <summary>At most this likely does a healthy suite go red in one run: the sum of the risks (union bound), in [0, 1].</summary>
    public double FalseFailure { get; }

    /// <summary>What the risks come to if no claim hangs on another: 1 − Π(1 − risk), without cancellation.</summary>
    public double IfIndependent => Entries.Aggregate(0.0, (red, entry) => red + (entry.Risk * (1 - red)));

    /// <summary>Trials of all claims together.</summary>
    public long Trials { get; }

    public bool WithinBudget => FalseFailure <= Budget;

    public IEnumerable<LedgerEntry> With(Outcome verdict) => Entries.Where(entry => entry.Verdict == verdict);

    public int Count(Outcome verdict) => With(verdict).Count();
}
