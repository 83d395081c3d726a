using Assize.Bounds;

namespace Assize;

/// <summary>Catoni's statistic decides at the last trial: draws of which only the standard deviation is
/// bounded.</summary>
sealed class InfluenceCap : MeanCap
{
    readonly MeanPlan _plan;
    readonly Edges _edges;
    readonly double _limit;
    CompensatedSum _above;
    CompensatedSum _below;
    long _trials;

    public InfluenceCap(MeanPlan plan, long trials)
    {
        (_plan, _edges, Trials, Theorem) = (plan, plan.Edges, trials, plan.Theorem);
        _limit = plan.InfluenceLimitAt(trials);
    }

    public override long Trials { get; }

    public override string Theorem { get; }

    public override string Accepts => $"sums of Catoni's influence below {Wording.Number(_limit)}";

    public override Outcome? Add(double draw)
    {
        if (_edges.UpperEdge is { } upper)
            _above.Add(_plan.InfluenceOf(draw - upper));
        if (_edges.LowerEdge is { } lower)
            _below.Add(_plan.InfluenceOf(lower - draw));
        if (++_trials < Trials)
            return null;

        return Math.Max(_above.Value, _below.Value) >= _limit ? Outcome.Refuted : Outcome.Upheld;
    }
}
