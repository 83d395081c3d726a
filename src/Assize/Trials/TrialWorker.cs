using System.Runtime.ExceptionServices;

namespace Assize;

/// <summary>Produces the draws of a block of trials with a generator of its own.</summary>
sealed class TrialWorker<TDraw>(Hearing hearing, TrialClock clock)
{
    readonly TrialRandom _random = new();
    TDraw[] _draws = [];
    int _count;
    Exception? _failure;

    /// <summary>How many trials gave a draw: fewer than asked for when one threw or the clock ended them.</summary>
    public int Count => _count;

    public void Run(Func<Random, TDraw> trial, long first, int count)
    {
        var draws = Begin(count).AsSpan(0, count);
        int done = 0;
        try
        {
            for (; done < draws.Length && !clock.MustEnd; done++)
            {
                _random.Start(hearing.Stream, first + done);
                draws[done] = trial(_random);
            }
        }
        catch (Exception cause)
        {
            _failure = cause;
        }

        _count = done;
    }

    public async Task RunAsync(Func<Random, Task<TDraw>> trial, long first, int count)
    {
        var draws = Begin(count);
        try
        {
            for (; _count < count && !clock.MustEnd; _count++)
            {
                _random.Start(hearing.Stream, first + _count);
                draws[_count] = await trial(_random).ConfigureAwait(false);
            }
        }
        catch (Exception cause)
        {
            _failure = cause;
        }
    }

    /// <summary>Hands the draws to the race. A trial that threw matters only if the race is undecided after the one before
    /// it.</summary>
    public void Fold(IRace<TDraw> race, long first)
    {
        if (race.Outcome is null)
            race.Add(_draws.AsSpan(0, _count));
        if (race.Outcome is not null || _failure is not { } cause)
            return;
        if (clock.IsStopping(cause))
            ExceptionDispatchInfo.Throw(cause);
        throw hearing.Failed(first + _count, cause);
    }

    TDraw[] Begin(int count)
    {
        (_count, _failure) = (0, null);
        return _draws.Length < count ? _draws = new TDraw[count] : _draws;
    }
}
