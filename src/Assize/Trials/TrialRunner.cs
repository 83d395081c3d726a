namespace Assize;

/// <summary>Runs trials for a race. Workers only produce draws; the race takes them one by one, in trial order.</summary>
sealed class TrialRunner<TDraw>(Hearing hearing, IRace<TDraw> race, int? block = null)
{
    const int FirstBlock = 8;
    const int LargestBlock = 4096;

    readonly CancellationToken _stop = hearing.Claim.Terms.Stop;
    readonly long _timeOut = hearing.Claim.Terms.TimeCap is { } cap ? Environment.TickCount64 + (long)cap.TotalMilliseconds : long.MaxValue;

    /// <summary>One trial after another on the calling thread: nothing is drawn beyond the verdict.</summary>
    public void Run(Func<Random, TDraw> trial)
    {
        var random = new TrialRandom();
        for (long number = 1; race.Outcome is null && !IsTimeOut(); number++)
        {
            TDraw draw;
            try
            {
                random.Start(hearing.Stream, number);
                draw = trial(random);
            }
            catch (Exception cause) when (cause is not OperationCanceledException || !_stop.IsCancellationRequested)
            {
                throw hearing.Failed(number, cause);
            }

            race.Add(draw);
        }
    }

    /// <summary>A block of trials for each worker at a time, then the race takes them all.</summary>
    public async Task RunInParallelAsync(Func<TrialRandom, long, ValueTask<TDraw>> trial)
    {
        int threads = hearing.Claim.Terms.Threads;
        int size = block ?? (threads == 1 ? 1 : FirstBlock);
        var workers = Enumerable.Range(0, threads).Select(_ => new TrialWorker<TDraw>()).ToArray();
        for (long next = 1; race.Outcome is null && !IsTimeOut(); next += (long)threads * size)
        {
            if (next > 1 && block is null && threads > 1)
                size = (int)Math.Min(LargestBlock, Math.Max(FirstBlock, (next - 1) / threads / 4));
            await ProduceAsync(workers, trial, next, size).ConfigureAwait(false);
            foreach (var worker in workers)
                Fold(worker);
        }
    }

    static Task ProduceAsync(TrialWorker<TDraw>[] workers, Func<TrialRandom, long, ValueTask<TDraw>> trial, long first, int size) =>
        workers.Length == 1
            ? workers[0].RunAsync(trial, first, size)
            : Task.WhenAll(workers.Select((worker, i) => Task.Run(() => worker.RunAsync(trial, first + (long)i * size, size))));

    // A trial that threw matters only if the race is undecided after the one before it.
    void Fold(TrialWorker<TDraw> worker)
    {
        foreach (var draw in worker.Draws)
        {
            if (race.Outcome is not null)
                return;

            race.Add(draw);
        }

        if (race.Outcome is null && worker.Failure is { } cause)
            throw _stop.IsCancellationRequested && cause is OperationCanceledException ? cause : hearing.Failed(worker.FailedTrial, cause);
    }

    bool IsTimeOut()
    {
        _stop.ThrowIfCancellationRequested();
        return _timeOut != long.MaxValue && Environment.TickCount64 >= _timeOut;
    }
}
