namespace Assize;

/// <summary>Runs blocks of trials on several threads. Workers only produce draws; the race takes them in trial
/// order.</summary>
/// <remarks>The block is fixed by a test; otherwise it grows with the trials, so that few are drawn beyond the
/// verdict.</remarks>
sealed class ParallelRunner<TDraw>
{
    const long FirstBlock = 8;
    const long LargestBlock = 4096;
    const int Growth = 4;

    readonly IRace<TDraw> _race;
    readonly int? _block;
    readonly TrialClock _clock;
    readonly TrialWorker<TDraw>[] _workers;
    long _next = 1;

    public ParallelRunner(Hearing hearing, IRace<TDraw> race, TrialClock clock, int? block = null)
    {
        (_race, _block, _clock) = (race, block, clock);
        _workers =
            [.. Enumerable.Range(0, hearing.Claim.Terms.Threads).Select(_ => new TrialWorker<TDraw>(hearing, _clock))];
    }

    int Block => _block ?? (int)Math.Clamp(_next / _workers.Length / Growth, FirstBlock, LargestBlock);

    public void Run(Func<Random, TDraw> trial)
    {
        while (_race.Outcome is null && !_clock.IsOver())
        {
            var (first, size) = (_next, Block);
            var others = Enumerable.Range(1, _workers.Length - 1)
                .Select(i => Task.Run(() => _workers[i].Run(trial, first + (long)i * size, size))).ToArray();
            _workers[0].Run(trial, first, size);
            Task.WaitAll(others);
            Fold(size);
        }
    }

    public async Task RunAsync(Func<Random, Task<TDraw>> trial)
    {
        while (_race.Outcome is null && !_clock.IsOver())
        {
            var (first, size) = (_next, Block);
            await Task.WhenAll(_workers.Select((worker, i) =>
                Task.Run(() => worker.RunAsync(trial, first + (long)i * size, size)))).ConfigureAwait(false);
            Fold(size);
        }
    }

    // Draws after a gap that the clock left are not of the next trials.
    void Fold(int size)
    {
        foreach (var worker in _workers)
        {
            worker.Fold(_race, _next);
            _next += worker.Count;
            if (worker.Count < size)
                break;
        }
    }
}
