namespace Assize;

/// <summary>Runs one trial after another: nothing is drawn beyond the verdict, since only the last trial of a block may
/// bring it.</summary>
sealed class SerialRunner<TDraw>
{
    const long LargestBlock = 1024;

    readonly IRace<TDraw> _race;
    readonly TrialClock _clock;
    readonly TrialWorker<TDraw> _worker;
    long _next = 1;

    public SerialRunner(Hearing hearing, IRace<TDraw> race, TrialClock clock)
    {
        (_race, _clock) = (race, clock);
        _worker = new TrialWorker<TDraw>(hearing, _clock);
    }

    int Block => (int)Math.Min(_race.Quiet, LargestBlock);

    public void Run(Func<Random, TDraw> trial)
    {
        while (_race.Outcome is null && !_clock.IsOver())
        {
            _worker.Run(trial, _next, Block);
            Fold();
        }
    }

    public async Task RunAsync(Func<Random, Task<TDraw>> trial)
    {
        while (_race.Outcome is null && !_clock.IsOver())
        {
            await _worker.RunAsync(trial, _next, Block).ConfigureAwait(false);
            Fold();
        }
    }

    void Fold()
    {
        _worker.Fold(_race, _next);
        _next += _worker.Count;
    }
}
