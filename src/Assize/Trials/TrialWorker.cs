namespace Assize;

/// <summary>Produces the draws of a block of trials with a generator of its own.</summary>
sealed class TrialWorker<TDraw>(ulong stream)
{
    readonly TrialRandom _random = new();
    TDraw[] _draws = [];
    int _count;

    /// <summary>The draws up to the end of the block, or up to the trial that threw.</summary>
    public ReadOnlySpan<TDraw> Draws => _draws.AsSpan(0, _count);

    /// <summary>What the trial after the last draw threw; null when none did.</summary>
    public Exception? Failure { get; private set; }

    /// <summary>The trial that threw, counted from 1.</summary>
    public long FailedTrial { get; private set; }

    public async Task RunAsync(Func<Random, ValueTask<TDraw>> trial, long first, int count)
    {
        if (_draws.Length < count)
            _draws = new TDraw[count];
        (_count, Failure) = (0, null);
        for (long number = first; _count < count; number++)
        {
            try
            {
                _random.Start(stream, number);
                _draws[_count] = await trial(_random).ConfigureAwait(false);
                _count++;
            }
            catch (Exception cause)
            {
                (Failure, FailedTrial) = (cause, number);
                return;
            }
        }
    }
}
