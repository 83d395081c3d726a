using System.Diagnostics;
using Assize.Bounds;

namespace Assize;

/// <summary>One judging of one claim: its seed, its stream, the test around it; from the first trial to the
/// verdict.</summary>
sealed class Hearing
{
    // No name of an assembly, a test or a claim contains it, so that different parts never make the same whole.
    const char Separator = '\u001f';

    Hearing(Claim claim, Site site, HostContext host)
    {
        (Claim, Site, Host, Seed) = (claim, site, host, RunSeed.Current);
        string name = string.Join(Separator, host.Assembly, host.Test, claim.Name, claim.Sentence);
        Stream = StreamKey.Of(Seed, $"{name}{Separator}{Occurrences.Next(name)}");
    }

    public Claim Claim { get; }

    public Site Site { get; }

    public HostContext Host { get; }

    public ulong Seed { get; }

    /// <summary>The key of the draws: of the seed, the test with its data row, the claim and its occurrence.</summary>
    public ulong Stream { get; }

    // The framework's context belongs to the calling thread, so it is captured here and never looked up again.
    public static Hearing Of(Claim claim, Site site) => new(claim, site, HostContext.Current(claim, site));

    public Verdict Run<TDraw>(Func<IRace<TDraw>> start, Func<Random, TDraw> trial)
    {
        if (OnlyTrial() is { } only)
            throw Alone(only, trial(TrialRandom.At(only.Stream, only.Trial)));

        var race = start();
        var clock = Stopwatch.StartNew();
        using var progress = Progress(race);
        if (Claim.Terms.Threads == 1)
            new SerialRunner<TDraw>(this, race, progress).Run(trial);
        else
            new ParallelRunner<TDraw>(this, race, progress, (race as IBatched)?.Block).Run(trial);
        return Decided(race.Report(), race.Outcome, clock.Elapsed);
    }

    public async Task<Verdict> RunAsync<TDraw>(Func<IRace<TDraw>> start, Func<Random, Task<TDraw>> trial)
    {
        if (OnlyTrial() is { } only)
            throw Alone(only, await trial(TrialRandom.At(only.Stream, only.Trial)).ConfigureAwait(false));

        var race = start();
        var clock = Stopwatch.StartNew();
        using var progress = Progress(race);
        if (Claim.Terms.Threads == 1)
            await new SerialRunner<TDraw>(this, race, progress).RunAsync(trial).ConfigureAwait(false);
        else
            await new ParallelRunner<TDraw>(this, race, progress, (race as IBatched)?.Block).RunAsync(trial).ConfigureAwait(false);
        return Decided(race.Report(), race.Outcome, clock.Elapsed);
    }

    /// <summary>Judges draws that are there already, in their order.</summary>
    /// <exception cref="ClaimRefusedException">They end before the claim is decided.</exception>
    public Verdict RunFor<TDraw>(IRace<TDraw> race, ReadOnlySpan<TDraw> sample)
    {
        RequireNoOnlyTrial();
        var clock = Stopwatch.StartNew();
        race.Add(sample);
        return DecidedFor(race, sample.Length, clock);
    }

    /// <inheritdoc cref="RunFor{TDraw}(IRace{TDraw}, ReadOnlySpan{TDraw})"/>
    public Verdict RunFor<TDraw>(IRace<TDraw> race, IEnumerable<TDraw> sample)
    {
        RequireNoOnlyTrial();
        var (clock, trials) = (Stopwatch.StartNew(), 0L);
        using var end = Progress(race);
        using var draws = sample.GetEnumerator();
        for (; race.Outcome is null && !end.IsOver() && draws.MoveNext(); trials++)
            race.Add(draws.Current);
        return DecidedFor(race, trials, clock);
    }

    /// <inheritdoc cref="RunFor{TDraw}(IRace{TDraw}, ReadOnlySpan{TDraw})"/>
    public async Task<Verdict> RunForAsync<TDraw>(IRace<TDraw> race, IAsyncEnumerable<TDraw> sample)
    {
        RequireNoOnlyTrial();
        var (clock, trials) = (Stopwatch.StartNew(), 0L);
        using var end = Progress(race);
        var draws = sample.GetAsyncEnumerator(Claim.Terms.Stop);
        await using (draws.ConfigureAwait(false))
        {
            for (; race.Outcome is null && !end.IsOver() && await draws.MoveNextAsync().ConfigureAwait(false); trials++)
                race.Add(draws.Current);
        }

        return DecidedFor(race, trials, clock);
    }

    // A sample that ends too soon has decided nothing: neither green nor red would be true.
    Verdict DecidedFor<TDraw>(IRace<TDraw> race, long trials, Stopwatch clock)
    {
        if (race.Outcome is not null || Claim.Terms.MayStayUndecided)
            return Decided(race.Report(), race.Outcome, clock.Elapsed);

        var plan = Claim.Plan();
        throw new ClaimRefusedException($"The sample is too small: its {Wording.Trials(trials)} leave it open whether "
            + $"{Claim.Sentence}. {Wording.Number(plan.TrialCap)} always decide"
            + (plan.Expected is { } expected ? $", about {Wording.Number((long)Math.Ceiling(expected.AtTarget))} mostly do when it is right" : "")
            + ". Give more draws, or a larger defect.");
    }

    void RequireNoOnlyTrial()
    {
        if (Claim.Terms.OnlyTrial is not null)
            throw new ClaimRefusedException("OnlyTrial runs one trial; a sample that is there already has none. Take OnlyTrial out.");
    }

    public TrialFailedException Failed(long trial, Exception cause)
    {
        string? key = Site.CanReplay ? ReplayKey.Of(Seed, Stream, trial).ToString() : null;
        return new TrialFailedException(VerdictText.OfFailedTrial(cause, trial, key), trial, key, cause);
    }

    /// <summary>The trial to run alone; null when the claim is to be judged.</summary>
    ReplayKey? OnlyTrial() => Claim.Terms.OnlyTrial is null || Site.CanReplay
        ? Claim.Terms.OnlyTrial
        : throw new ClaimRefusedException("OnlyTrial cannot bring back a trial that takes no generator: "
            + "let it draw from the Random it is given, or take OnlyTrial out.");

    // One trial decides nothing: the test must not pass by it.
    static ClaimRefusedException Alone<TDraw>(ReplayKey key, TDraw draw) =>
        new(VerdictText.OfOnlyTrial(key, draw?.ToString()));

    TrialClock Progress<TDraw>(IRace<TDraw> race) =>
        new(Claim.Terms, () => Host.Write(VerdictText.Progress(Claim, race.Report())));

    Verdict Decided(RaceReport report, Outcome? outcome, TimeSpan elapsed)
    {
        var verdict = new Verdict(this, report, outcome ?? Outcome.Undecided, elapsed);
        Host.Write(VerdictText.Line(verdict));
        Ledger.Record(verdict);
        return verdict;
    }
}
