using Assize.Bounds;

namespace Assize;

/// <summary>The fixed plan: so many trials, then the count decides.</summary>
sealed class FixedRate(RatePlan plan, RateLimits limits) : IRace<bool>
{
    long _trials;
    long _successes;

    public Outcome? Outcome => _trials < limits.Trials ? null
        : limits.Accept(_successes) ? Assize.Outcome.Upheld
        : Assize.Outcome.Refuted;

    public long Quiet => limits.Trials - _trials;

    public void Add(bool draw) => Add([draw]);

    public void Add(ReadOnlySpan<bool> draws)
    {
        var wanted = draws[..(int)Math.Min(draws.Length, limits.Trials - _trials)];
        _trials += wanted.Length;
        _successes += wanted.Count(true);
    }

    public RaceReport Report()
    {
        var bets = new RateBets(plan.Edges);
        var report = RateReport.Of(plan, bets, _trials, _successes, plan.Theorem, limits.Trials);
        return Outcome is null ? report : report with { Accepts = Wording.Counts(limits) };
    }
}
