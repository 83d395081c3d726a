namespace Assize;

/// <summary>Runs one trial after another: nothing is drawn beyond the verdict.</summary>
sealed class SerialRunner<TDraw>(Hearing hearing, IRace<TDraw> race)
{
    readonly TrialClock _clock = new(hearing.Claim.Terms);
    readonly TrialRandom _random = new();

    public void Run(Func<Random, TDraw> trial)
    {
        for (long number = 1; race.Outcome is null && !_clock.IsOver(); number++)
        {
            TDraw draw;
            try
            {
                _random.Start(hearing.Stream, number);
                draw = trial(_random);
            }
            catch (Exception cause) when (!_clock.IsStopping(cause))
            {
                throw hearing.Failed(number, cause);
            }

            race.Add(draw);
        }
    }

    public async Task RunAsync(Func<Random, Task<TDraw>> trial)
    {
        for (long number = 1; race.Outcome is null && !_clock.IsOver(); number++)
        {
            TDraw draw;
            try
            {
                _random.Start(hearing.Stream, number);
                draw = await trial(_random).ConfigureAwait(false);
            }
            catch (Exception cause) when (!_clock.IsStopping(cause))
            {
                throw hearing.Failed(number, cause);
            }

            race.Add(draw);
        }
    }
}
