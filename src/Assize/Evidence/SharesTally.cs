namespace Assize;

/// <summary>How often each category came, and what that says.</summary>
sealed class SharesTally(ManyStakes stakes, Func<int, string> name)
{
    const int MostRows = 5;

    // A ledger's line stays readable; beyond this many, a chosen few would bias whoever bets on them later.
    const int MostCounts = 1_000;

    readonly long[] _counts = new long[stakes.Plan.Rates.Count];
    bool _isImpossible;

    public long Trials { get; private set; }

    public ReadOnlySpan<long> Counts => _counts;

    public void Add(int cell)
    {
        Trials++;
        _counts[cell]++;
    }

    /// <summary>Takes a draw that refutes at once: of no category, or of one that never comes.</summary>
    public void AddImpossible(int cell)
    {
        Trials++;
        _isImpossible = true;
        if (cell >= 0)
            _counts[cell]++;
    }

    public bool IsWithin(IReadOnlyList<(long Low, long High)> limits)
    {
        for (int cell = 0; cell < _counts.Length; cell++)
        {
            var (low, high) = limits[stakes.Plan.KindOf[cell]];
            if (_counts[cell] < low || _counts[cell] > high)
                return false;
        }

        return true;
    }

    public RaceReport Report(
        string theorem, long cap, double? together, IReadOnlyList<(long Low, long High)>? limits = null)
    {
        var sides = new RateSides(stakes, _counts, Trials);
        var rows = Trials == 0 ? [] : sides.FarthestOff().ToList();
        return new RaceReport
        {
            Trials = Trials,
            Observed = double.NaN,
            Seen = rows.Count == 0 ? null : $"{name(rows[0])} {Wording.Count(_counts[rows[0]], Trials)} where "
                + $"{Wording.Number(stakes.Plan.Rates[rows[0]].Target)} is claimed, the farthest off of {Wording.Number((long)_counts.Length)}",
            Interval = (double.NaN, double.NaN),
            LogEvidenceAgainstClaim = _isImpossible ? double.PositiveInfinity : sides.AgainstClaim(together),
            LogEvidenceAgainstDefectBelow = sides.AgainstDefectBelow(),
            LogEvidenceAgainstDefectAbove = sides.AgainstDefectAbove(),
            Miss = stakes.Plan.Miss,
            Theorem = theorem,
            Cap = cap,
            Accepts = limits is null ? null : "counts within the limits of every category",
            Details = [.. Rows(sides, rows, limits)],
            Counts = _counts.Length > MostCounts ? null : Named(),
        };
    }

    IEnumerable<(string Label, string Content)> Rows(
        RateSides sides, List<int> rows, IReadOnlyList<(long Low, long High)>? limits)
    {
        int off = rows.TakeWhile(sides.IsBeyondTolerance).Count();
        foreach (int cell in rows.Take(Math.Min(off, MostRows)))
        {
            var edges = stakes.Plan.Rates[cell];
            string right = $"right from {Wording.Number(edges.LowerEdge ?? 0)} to {Wording.Number(edges.UpperEdge ?? 1)}";
            string outside = limits?[stakes.Plan.KindOf[cell]] is { } limit && (_counts[cell] < limit.Low || _counts[cell] > limit.High)
                ? $"; the count is not within {Wording.Number(limit.Low)} to {Wording.Number(limit.High)}" : "";
            yield return ("off", $"{name(cell)}: {Wording.Count(_counts[cell], Trials)}, {right}; "
                + $"evidence against it alone {Wording.Odds(sides.AgainstClaim(cell))}{outside}");
        }

        if (off > MostRows)
            yield return ("", $"and {Wording.Number((long)off - MostRows)} more beyond their tolerance");
    }

    Dictionary<string, double> Named()
    {
        var counts = new Dictionary<string, double>(_counts.Length);
        for (int cell = 0; cell < _counts.Length; cell++)
        {
            string key = name(cell);
            if (!counts.TryAdd(key, _counts[cell]))
                counts.Add($"{key} #{cell + 1}", _counts[cell]);
        }

        return counts;
    }
}
