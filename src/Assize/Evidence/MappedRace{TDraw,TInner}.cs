namespace Assize;

/// <summary>A race about something made of each draw.</summary>
sealed class MappedRace<TDraw, TInner>(IRace<TInner> race, Func<TDraw, TInner> map, Func<RaceReport, RaceReport>? told = null)
    : IRace<TDraw>
{
    public Outcome? Outcome => race.Outcome;

    public long Quiet => race.Quiet;

    public void Add(TDraw draw) => race.Add(map(draw));

    public void Add(ReadOnlySpan<TDraw> draws)
    {
        foreach (var draw in draws)
        {
            if (race.Outcome is not null)
                return;

            race.Add(map(draw));
        }
    }

    public RaceReport Report() => told is null ? race.Report() : told(race.Report());
}
