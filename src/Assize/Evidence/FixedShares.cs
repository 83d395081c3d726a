namespace Assize;

/// <summary>The fixed plan: so many trials, then the counts decide.</summary>
sealed class FixedShares : IRace<int>
{
    readonly ManyStakes _stakes;
    readonly SharesTally _tally;
    readonly long _trials;
    readonly IReadOnlyList<(long Low, long High)> _limits;

    public FixedShares(ManyStakes stakes, Func<int, string> name, long trials)
    {
        (_stakes, _tally, _trials) = (stakes, new SharesTally(stakes, name), trials);
        _limits = stakes.Plan.LimitsAt(trials);
    }

    public Outcome? Outcome { get; private set; }

    public void Add(int draw)
    {
        if (draw < 0 || _stakes.Plan.Rates[draw].UpperEdge == 0)
        {
            _tally.AddImpossible(draw);
            Outcome = Assize.Outcome.Refuted;
            return;
        }

        _tally.Add(draw);
        if (_tally.Trials == _trials)
            Outcome = _tally.IsWithin(_limits) ? Assize.Outcome.Upheld : Assize.Outcome.Refuted;
    }

    public void Add(ReadOnlySpan<int> draws)
    {
        foreach (int draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report() => _tally.Trials == _trials
        ? _tally.Report(_stakes.Plan.Theorem, _trials, null, _limits)
        : _tally.Report(_stakes.Plan.Theorem, _trials, null);
}
