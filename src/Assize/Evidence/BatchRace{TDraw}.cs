namespace Assize;

/// <summary>A race whose draws come in batches; its verdict is that of the draws one by one.</summary>
sealed class BatchRace<TDraw>(IRace<TDraw> race, int size) : IRace<TDraw[]>, IBatched
{
    const int DrawsAtOnce = 4096;

    public int Block => Math.Max(1, DrawsAtOnce / size);

    public Outcome? Outcome => race.Outcome;

    public long Quiet => Math.Max(1, race.Quiet / size);

    public void Add(TDraw[] draw) => race.Add(draw);

    public void Add(ReadOnlySpan<TDraw[]> draws)
    {
        foreach (var batch in draws)
        {
            if (race.Outcome is not null)
                return;

            race.Add(batch);
        }
    }

    public RaceReport Report() => race.Report();
}
