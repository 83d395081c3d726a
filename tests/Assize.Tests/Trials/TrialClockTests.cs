namespace Assize.Tests.Trials;

public class TrialClockTests
{
    // Waits for a timer of a millisecond, for a minute at most.
    [Fact]
    public void Long_trials_are_told_of_on_the_thread_that_runs_them()
    {
        int told = 0, thread = 0;
        using var clock = new TrialClock(new Terms(), () => (told, thread) = (told + 1, Environment.CurrentManagedThreadId), TimeSpan.FromMilliseconds(1));

        Assert.True(SpinWait.SpinUntil(() => clock.IsOver() || told > 2, TimeSpan.FromMinutes(1)));
        Assert.Equal(Environment.CurrentManagedThreadId, thread);
    }

    [Fact]
    public void A_cancelled_token_ends_the_trials()
    {
        using var source = new CancellationTokenSource();
        using var clock = new TrialClock(new Terms { Stop = source.Token });
        Assert.False(clock.IsOver());

        source.Cancel();

        Assert.Throws<OperationCanceledException>(() => clock.IsOver());
    }

    [Fact]
    public void A_time_cap_that_has_passed_ends_them()
    {
        using var clock = new TrialClock(new Terms { TimeCap = TimeSpan.FromTicks(1) });

        Assert.True(SpinWait.SpinUntil(clock.IsOver, TimeSpan.FromMinutes(1)));
    }

    [Fact]
    public void What_is_told_names_the_claim_and_how_far_it_is()
    {
        var claim = Claim.Rate(0.5, tolerance: 0.1);
        var race = claim.NewRace();
        race.Add([true, false, true]);

        Assert.Matches(@"^Running: 3 of [\d,]+ trials at most; the rate is 0\.5, give or take 0\.1", VerdictText.Progress(claim, race.Report()));
    }
}
