namespace Assize;

/// <summary>Produces the draws of a block of trials with a generator of its own.</summary>
sealed class TrialWorker<TDraw>
{
    readonly TrialRandom _random = new();
    readonly List<TDraw> _draws = [];

    /// <summary>The draws up to the end of the block, or up to the trial that threw.</summary>
    public IReadOnlyList<TDraw> Draws => _draws;

    /// <summary>What the trial after the last draw threw; null when none did.</summary>
    public Exception? Failure { get; private set; }

    public long FailedTrial { get; private set; }

    public async Task RunAsync(Func<TrialRandom, long, ValueTask<TDraw>> trial, long first, int count)
    {
        (Failure, FailedTrial) = (null, 0);
        _draws.Clear();
        for (long number = first; number < first + count; number++)
        {
            try
            {
                _draws.Add(await trial(_random, number).ConfigureAwait(false));
            }
            catch (Exception cause)
            {
                (Failure, FailedTrial) = (cause, number);
                return;
            }
        }
    }
}
