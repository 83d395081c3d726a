using System.Collections.Concurrent;
using Assize.Bounds;

namespace Assize.Tests.Trials;

public class ParallelRunnerTests
{
    [Theory]
    [InlineData(0.3, 0.3)]
    [InlineData(0.3, 0.33)]
    [InlineData(0.3, 0.315)]
    public void The_verdict_is_the_same_for_one_thread_and_two_and_for_every_block(double target, double truth)
    {
        var claim = Claim.Rate(target, tolerance: 0.01).InParallel(2);
        var hearing = Hearing.Of(claim, new Site("", "", "", 0, Replay.Trial));
        var serial = Race(claim);
        new SerialRunner<bool>(hearing, serial, new TrialClock(claim.Terms)).Run(rng => rng.NextDouble() < truth);

        foreach (int block in (int[])[1, 7, 4096])
        {
            var parallel = Race(claim);
            int threads = Threads(hearing, parallel, truth, block);

            Assert.True(threads >= 2, $"{threads} thread");
            Assert.Equal((serial.Outcome, serial.Report()), (parallel.Outcome, parallel.Report()));
        }
    }

    // The first two threads to draw wait for each other: both have surely taken part.
    static int Threads(Hearing hearing, RateRace race, double truth, int block)
    {
        var seen = new ConcurrentDictionary<int, bool>();
        int arrived = 0;
        using var both = new Barrier(2);
        new ParallelRunner<bool>(hearing, race, new TrialClock(hearing.Claim.Terms), block).Run(rng =>
        {
            if (seen.TryAdd(Environment.CurrentManagedThreadId, true) && Interlocked.Increment(ref arrived) <= 2)
                both.SignalAndWait(TimeSpan.FromSeconds(30));
            return rng.NextDouble() < truth;
        });
        return seen.Count;
    }

    static RateRace Race(RateClaim claim) => new(RateStakes.Of(RatePlan.For(claim.Edges, claim.Risk, claim.Confidence)));

    // 6,905 trials without a success uphold the claim; the trial that throws is known by the first number it draws.
    [Theory]
    [InlineData(6_905, true)]
    [InlineData(6_906, false)]
    public void A_trial_that_throws_surfaces_only_before_the_verdict(long throwing, bool surfaces)
    {
        var claim = Claim.RateAtMost(0, defect: 0.001).InParallel(2);
        var hearing = Hearing.Of(claim, new Site("", "", "", 0, Replay.Trial));
        double poison = TrialRandom.At(hearing.Stream, throwing).NextDouble();
        var race = Race(claim);
        void Running() => new ParallelRunner<bool>(hearing, race, new TrialClock(hearing.Claim.Terms), 4096).Run(rng =>
            rng.NextDouble() == poison ? throw new InvalidOperationException("poison") : false);

        if (surfaces)
            Assert.Equal(throwing, Assert.Throws<TrialFailedException>(Running).Trial);
        else
            Running();
        Assert.Equal(surfaces ? null : Outcome.Upheld, race.Outcome);
    }
}
