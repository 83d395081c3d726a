namespace Assize;

/// <summary>A race about the categories of draws; what belongs to none refutes, and is shown.</summary>
sealed class CategoryRace<TDraw>(IRace<int> race, Func<TDraw, int> category, Func<TDraw, string> stranger) : IRace<TDraw>
{
    string? _stranger;

    public Outcome? Outcome => race.Outcome;

    public void Add(TDraw draw)
    {
        int number = category(draw);
        if (number < 0)
            _stranger = stranger(draw);
        race.Add(number);
    }

    public void Add(ReadOnlySpan<TDraw> draws)
    {
        foreach (var draw in draws)
        {
            if (race.Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report()
    {
        var report = race.Report();
        return _stranger is null ? report : report with
        {
            Seen = $"trial {Wording.Number(report.Trials)} drew {_stranger}",
            Details = [],
        };
    }
}
