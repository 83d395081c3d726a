using Assize.Bounds;

namespace Assize;

/// <summary>The fixed plan: so many trials, then the count decides.</summary>
sealed class FixedRate(Edges edges, RateLimits limits, double confidence) : IRace<bool>
{
    long _trials;
    long _successes;

    public Outcome? Outcome =>
        _trials < limits.Trials ? null : limits.Accept(_successes) ? Assize.Outcome.Upheld : Assize.Outcome.Refuted;

    public void Add(bool draw)
    {
        _trials++;
        if (draw)
            _successes++;
    }

    public RaceReport Report() =>
        RateReport.Of(new RateBets(edges), _trials, _successes, confidence, "exact binomial", limits.Trials);
}
