using Assize.Bounds;

namespace Assize.Tests.Claims;

/// <summary>Draws that exist already, and draws that come in batches.</summary>
public class SamplesTests
{
    static readonly bool[] Coin = Draw(new Random(7), 2_000);

    [Fact]
    public void Arrays_lists_and_streams_get_the_verdict_of_the_same_trials()
    {
        var claim = Claim.Rate(0.5, tolerance: 0.1).Named("coin");
        int next = 0;
        var drawn = claim.Judge(() => Coin[next++]);

        Assert.Equal(Outcome.Upheld, drawn.Outcome);
        Assert.Equal((drawn.Outcome, drawn.Trials, drawn.Observed), Told(claim.JudgeFor(Coin)));
        Assert.Equal(Told(drawn), Told(claim.JudgeFor(new List<bool>(Coin))));
        Assert.Equal(Told(drawn), Told(claim.JudgeFor(Coin.AsSpan())));
        claim.MustHoldFor(Coin);
    }

    [Fact]
    public async Task Asynchronous_streams_do_too()
    {
        var claim = Claim.Rate(0.5, tolerance: 0.1);

        Assert.Equal(Told(claim.JudgeFor(Coin)), Told(await claim.JudgeForAsync(Slowly())));
        await claim.MustHoldForAsync(Slowly());
        await Assert.ThrowsAsync<ClaimRefutedException>(() => Claim.Rate(0.9, tolerance: 0.05).MustHoldForAsync(Slowly()));

        static async IAsyncEnumerable<bool> Slowly()
        {
            foreach (bool draw in Coin)
            {
                await Task.Yield();
                yield return draw;
            }
        }
    }

    [Fact]
    public void A_sample_too_small_is_refused_and_told_how_many_it_takes()
    {
        var claim = Claim.Mean(2, tolerance: 0.5).DrawsBetween(0, 4);
        double[] sample = [1, 2, 3];

        string message = Assert.Throws<ClaimRefusedException>(() => claim.MustHoldFor(sample)).Message;

        Assert.Contains("its 3 trials leave it open whether the mean is 2, give or take 0.5", message, StringComparison.Ordinal);
        Assert.Contains($"{claim.Plan().TrialCap:#,0} always decide", message, StringComparison.Ordinal);
        Assert.Equal(Outcome.Undecided, claim.MayStayUndecided().JudgeFor(sample).Outcome);
    }

    [Fact]
    public void A_refuted_sample_names_no_seed()
    {
        var refuted = Assert.Throws<ClaimRefutedException>(() => Claim.Rate(0.9, tolerance: 0.05).MustHoldFor(Coin));

        Assert.Contains("  sample       Coin", refuted.Message, StringComparison.Ordinal);
        Assert.DoesNotContain("seed", refuted.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void One_trial_of_a_sample_cannot_be_run_alone() => Assert.Contains(
        "Take OnlyTrial out",
        Assert.Throws<ClaimRefusedException>(() => Claim.Rate(0.5, tolerance: 0.1)
            .OnlyTrial("00c0ffee00c0ffee-0123456789abcdef-17-net10").JudgeFor(Coin)).Message,
        StringComparison.Ordinal);

    [Fact]
    public void Batches_get_a_verdict_and_come_back_whole()
    {
        var claim = Claim.Mean(0.5, tolerance: 0.02).DrawsBetween(0, 1);

        Assert.Equal(Outcome.Upheld, claim.Judge(64, Fill).Outcome);
        Assert.Equal(Outcome.Refuted, claim.Judge(64, (rng, draws) => draws.Fill(rng.NextDouble() * 0.8)).Outcome);
        Assert.Equal(Outcome.Upheld, claim.InParallel(2).Judge(1, Fill).Outcome);
        Assert.Contains("A batch holds 1 trial or more; it is 0.", Assert.Throws<ClaimRefusedException>(() => claim.Judge(0, Fill)).Message, StringComparison.Ordinal);

        static void Fill(Random rng, Span<double> draws)
        {
            foreach (ref double draw in draws)
                draw = rng.NextDouble();
        }
    }

    [Fact]
    public void A_batch_that_throws_is_named()
    {
        int batch = 0;
        var failed = Assert.Throws<TrialFailedException>(() => Claim.Rate(0.5, tolerance: 0.001).Judge(
            100, (_, _) => throw new InvalidOperationException($"batch {++batch}")));

        Assert.Equal(1, failed.Trial);
    }

    static (Outcome, long, double) Told(Verdict verdict) => (verdict.Outcome, verdict.Trials, verdict.Observed);

    static bool[] Draw(Random rng, int count) => [.. Enumerable.Range(0, count).Select(_ => rng.Next(2) == 0)];
}
