namespace Assize;

/// <summary>Runs blocks of trials on several threads. Workers only produce draws; the race takes them in trial
/// order.</summary>
/// <remarks>The block is fixed by a test; otherwise it grows with the trials, so that few are drawn beyond the
/// verdict.</remarks>
sealed class ParallelRunner<TDraw>(Hearing hearing, IRace<TDraw> race, int? block = null)
{
    const long FirstBlock = 8;
    const long LargestBlock = 4096;
    const int Growth = 4;

    readonly TrialClock _clock = new(hearing.Claim.Terms);

    readonly TrialWorker<TDraw>[] _workers =
        [.. Enumerable.Range(0, hearing.Claim.Terms.Threads).Select(_ => new TrialWorker<TDraw>(hearing.Stream))];

    public async Task RunAsync(Func<Random, ValueTask<TDraw>> trial)
    {
        for (long next = 1; race.Outcome is null && !_clock.IsOver();)
        {
            int size = block ?? (int)Math.Clamp(next / _workers.Length / Growth, FirstBlock, LargestBlock);
            long first = next;
            await Task.WhenAll(_workers.Select((worker, i) =>
                Task.Run(() => worker.RunAsync(trial, first + (long)i * size, size)))).ConfigureAwait(false);
            foreach (var worker in _workers)
                Fold(worker);
            next += (long)_workers.Length * size;
        }
    }

    // A trial that threw matters only if the race is undecided after the one before it.
    void Fold(TrialWorker<TDraw> worker)
    {
        if (race.Outcome is null)
            race.Add(worker.Draws);
        if (race.Outcome is null && worker.Failure is { } cause)
            throw _clock.IsStopping(cause) ? cause : hearing.Failed(worker.FailedTrial, cause);
    }
}
