using Assize.Bounds;

namespace Assize;

/// <summary>The average decides at the last trial; before it, from time to time, an empirical Bernstein margin
/// may.</summary>
/// <remarks>
/// At each of m looks the average errs by more than its margin with probability risk/m (miss/m) at most, so over all of
/// them by risk (miss); the last plan has its own share. A. Maurer and M. Pontil, arXiv:0907.3740, Theorem 4, from memory.
/// </remarks>
sealed class AverageCap : MeanCap
{
    const double Ratio = 1.25;

    // Above the rounding of the average, in units of the range.
    const double Rounding = 1e-9;

    readonly Edges _edges;
    readonly MeanLimits _limits;
    readonly double _range;
    readonly double _redOdds;
    readonly double _greenOdds;
    Moments _moments;
    CompensatedSum _offsets;
    long _nextLook = long.MaxValue;

    /// <summary>The fixed plan alone.</summary>
    public AverageCap(MeanPlan plan, MeanLimits limits)
    {
        (_edges, _limits, Theorem) = (plan.Edges, limits, plan.Theorem);
        _range = plan.Facts.Range ?? 0;
    }

    AverageCap(MeanPlan plan, MeanLimits limits, long firstLook, double redOdds, double greenOdds) : this(plan, limits) =>
        (_nextLook, _redOdds, _greenOdds) = (firstLook, redOdds, greenOdds);

    /// <summary>A cap for shares of the error probabilities of a plan; with looks where they can come before the last
    /// trial.</summary>
    public static AverageCap For(MeanPlan plan, double share)
    {
        var alone = plan.Share(share, share);
        if (plan.Facts.Range is not { } range)
            return new AverageCap(alone, alone.LimitsAt(alone.Trials));

        var last = plan.Share(share / 2, share / 2);
        double sides = plan.Edges is { LowerEdge: not null, UpperEdge: not null } ? 2 : 1;
        double gap = Math.Min(plan.Edges.UpperDefect - plan.Edges.UpperEdge ?? range, plan.Edges.LowerEdge - plan.Edges.LowerDefect ?? range);
        double looks = 1, red = 0, green = 0, first = 0;
        // More looks cost odds, and odds move the first look: a few rounds settle it.
        for (int round = 0; round < 8; round++)
        {
            red = -Elementary.Log(plan.Risk * share / (4 * looks * sides));
            green = -Elementary.Log(plan.Miss * share / (4 * looks));
            first = 7 * range * (red + green) / (3 * gap) + 2;
            looks = Math.Max(1, Math.Ceiling(Math.Log(last.Trials / first) / Math.Log(Ratio)) + 2);
        }

        return first * 2 < last.Trials
            ? new AverageCap(last, last.LimitsAt(last.Trials), (long)first, red, green)
            : new AverageCap(alone, alone.LimitsAt(alone.Trials));
    }

    public override long Trials => _limits.Trials;

    public override string Theorem { get; }

    public override string Accepts => (_limits.AcceptLow, _limits.AcceptHigh) switch
    {
        (double.NegativeInfinity, var high) => $"averages up to {Wording.Number(high)}",
        (var low, double.PositiveInfinity) => $"averages from {Wording.Number(low)} up",
        var (low, high) => $"averages from {Wording.Number(low)} to {Wording.Number(high)}",
    };

    public override Outcome? Add(double draw)
    {
        _moments.Add(draw);
        _offsets.Add(draw - _edges.Target);
        if (_moments.Trials == _limits.Trials)
            return _limits.Accept(_edges.Target + _offsets.Value / _limits.Trials) ? Outcome.Upheld : Outcome.Refuted;
        if (_moments.Trials < _nextLook)
            return null;

        _nextLook = Math.Max(_nextLook + 1, (long)(_nextLook * Ratio));
        return Look();
    }

    Outcome? Look()
    {
        double red = Margin(_redOdds), green = Margin(_greenOdds), mean = _moments.Mean;
        if (mean - red > _edges.UpperEdge || mean + red < _edges.LowerEdge)
            return Outcome.Refuted;

        bool notAbove = _edges.UpperDefect is not { } above || mean + green < above;
        bool notBelow = _edges.LowerDefect is not { } below || mean - green > below;
        return notAbove && notBelow ? Outcome.Upheld : null;
    }

    double Margin(double odds)
    {
        double n = _moments.Trials;
        double variance = _moments.Squares / (n - 1);
        return (Math.Sqrt(2 * variance * odds / n) + 7 * _range * odds / (3 * (n - 1))) * (1 + Rounding) + Rounding * _range;
    }
}
