using System.Diagnostics;
using Assize.Bounds;

namespace Assize;

/// <summary>One judging of one claim: its seed, its stream, the test around it; from the first trial to the verdict.</summary>
sealed class Hearing
{
    Hearing(Claim claim, Site site, HostContext host)
    {
        (Claim, Site, Host, Seed) = (claim, site, host, RunSeed.Current);
        Identity = Identities.Of(claim, site, host);
        Stream = claim.Terms.OnlyTrial?.Stream ?? StreamKey.Of(Seed, Identity);
    }

    public Claim Claim { get; }

    public Site Site { get; }

    public HostContext Host { get; }

    public ulong Seed { get; }

    /// <summary>What tells this claim from every other of the run: the test with its data row, the claim and its occurrence.</summary>
    public string Identity { get; }

    public ulong Stream { get; }

    // The framework's context belongs to the calling thread, so it is captured here and never looked up again.
    public static Hearing Of(Claim claim, Site site) => new(claim, site, HostContext.Current(claim, site));

    public Verdict Run<TDraw>(IRace<TDraw> race, Func<Random, TDraw> trial)
    {
        if (Claim.Terms.OnlyTrial is { } only)
            throw Alone(only, trial(Started(only.Trial)));

        var clock = Stopwatch.StartNew();
        var runner = new TrialRunner<TDraw>(this, race);
        if (Claim.Terms.Threads == 1)
            runner.Run(trial);
        else
            runner.RunInParallelAsync(Sync(trial)).GetAwaiter().GetResult();
        return Decided(race, clock.Elapsed);
    }

    public async Task<Verdict> RunAsync<TDraw>(IRace<TDraw> race, Func<Random, Task<TDraw>> trial)
    {
        ValueTask<TDraw> Draw(TrialRandom random, long number)
        {
            random.Start(Stream, number);
            return new(trial(random));
        }

        if (Claim.Terms.OnlyTrial is { } only)
            throw Alone(only, await trial(Started(only.Trial)).ConfigureAwait(false));

        var clock = Stopwatch.StartNew();
        await new TrialRunner<TDraw>(this, race).RunInParallelAsync(Draw).ConfigureAwait(false);
        return Decided(race, clock.Elapsed);
    }

    public TrialFailedException Failed(long trial, Exception cause)
    {
        string? key = Site.CanReplay ? ReplayKey.Of(Stream, trial).ToString() : null;
        return new TrialFailedException(VerdictText.OfFailedTrial(cause, trial, key), trial, key, cause);
    }

    TrialRandom Started(long trial)
    {
        var random = new TrialRandom();
        random.Start(Stream, trial);
        return random;
    }

    Func<TrialRandom, long, ValueTask<TDraw>> Sync<TDraw>(Func<Random, TDraw> trial) => (random, number) =>
    {
        random.Start(Stream, number);
        return new(trial(random));
    };

    // One trial decides nothing: the test must not pass by it.
    static ClaimRefusedException Alone<TDraw>(ReplayKey key, TDraw draw) => new(
        $"Trial {key.Trial} ran alone and yielded {draw}. One trial judges no claim: take OnlyTrial out again.");

    Verdict Decided<TDraw>(IRace<TDraw> race, TimeSpan elapsed)
    {
        var verdict = new Verdict(this, race.Report(), race.Outcome ?? Outcome.Undecided, elapsed);
        Host.Write(VerdictText.Line(verdict));
        Ledger.Record(verdict);
        return verdict;
    }
}
