using Assize.Bounds;

namespace Assize;

/// <summary>Bets beside normal draws on their standard deviation, whatever their mean.</summary>
/// <remarks>
/// The deviation of a draw from the average of those before it, squared and times (n - 1)/n, is the variance times a
/// chi-square variable of one degree, independent of the past (Helmert's transformation).
/// </remarks>
sealed class NormalSpreadRace : IRace<double>
{
    const double LogTwo = 0.693147180559945309417;
    const double Reserve = 0.1;
    const string Theorem = "likelihood-ratio bets on normal draws, Ville's inequality";

    // Beyond so many times the target no deviation gets a bet of its own.
    const double Reach = 16;

    readonly NormalSpreadPlan _plan;
    readonly NormalSpreadPlan _last;
    readonly (double AcceptLow, double AcceptHigh) _limits;
    readonly ScaleBet? _tooWide;
    readonly ScaleBet? _tooNarrow;
    readonly ScaleBet? _defectAbove;
    readonly ScaleBet? _defectBelow;
    readonly bool _isFixed;
    readonly long _end;
    Moments _moments;
    CompensatedSum _squares;
    bool _notAbove;
    bool _notBelow;
    bool _decidedByLimits;
    double? _notANumber;

    /// <summary>A race; or the fixed plan alone, when a number of trials is given.</summary>
    public NormalSpreadRace(NormalSpreadPlan plan, long? exactly, long? authorCap)
    {
        _plan = plan;
        _isFixed = exactly is not null;
        _last = _isFixed ? plan : plan.Share(Reserve);
        long trials = exactly ?? _last.Trials;
        _limits = _last.LimitsAt(trials);
        LastTrial = trials;
        _end = Math.Min(trials, authorCap ?? long.MaxValue);
        var edges = plan.Edges;
        if (edges.UpperEdge is > 0 and { } upper)
            _tooWide = new ScaleBet([.. Above(edges.Target, edges.UpperDefect)], upper);
        if (edges.LowerEdge is > 0 and { } lower)
            _tooNarrow = new ScaleBet([.. Below(edges.Target, edges.LowerDefect)], lower);
        if (edges.UpperDefect is { } above)
            _defectAbove = new ScaleBet(Right(edges.Target, edges.UpperEdge!.Value), above);
        if (edges.LowerDefect is > 0 and { } below)
            _defectBelow = new ScaleBet(Right(edges.Target, edges.LowerEdge!.Value), below);
        (_notAbove, _notBelow) = (_defectAbove is null, _defectBelow is null);
    }

    public long LastTrial { get; }

    public Outcome? Outcome { get; private set; }

    public void Add(double draw)
    {
        if (!double.IsFinite(draw))
        {
            (_notANumber, Outcome) = (draw, Assize.Outcome.Refuted);
            return;
        }

        double before = _moments.Trials;
        double deviation = draw - _moments.Mean;
        _moments.Add(draw);
        if (before > 0)
            _squares.Add(deviation * deviation * (before / (before + 1)));
        Outcome = (_isFixed || before == 0 ? null : Raced()) ?? AtEnd();
    }

    public void Add(ReadOnlySpan<double> draws)
    {
        foreach (double draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report()
    {
        long n = _moments.Trials;
        return new RaceReport
        {
            Trials = n,
            LastTrial = _notANumber is null ? null : n + 1,
            Observed = n < 2 ? double.NaN : Math.Sqrt(_squares.Value / (n - 1)),
            Interval = Interval(),
            LogEvidenceAgainstClaim = AgainstClaim(),
            LogEvidenceAgainstDefectBelow = _defectBelow?.LogAtLeast(n - 1, _squares.Value),
            LogEvidenceAgainstDefectAbove = _defectAbove?.LogAtLeast(n - 1, _squares.Value),
            Miss = _plan.Miss,
            Theorem = _decidedByLimits ? NormalSpreadPlan.Theorem : Theorem,
            Cap = _end,
            Accepts = _decidedByLimits ? Accepts() : null,
            Contradiction = _notANumber is { } draw ? $"trial {Wording.Number(n + 1)} drew {Wording.Exact(draw)}, which is no number" : null,
            Counts = new Dictionary<string, double> { ["mean"] = _moments.Mean, ["squares"] = _squares.Value },
        };
    }

    Outcome? Raced()
    {
        long n = _moments.Trials - 1;
        double sum = _squares.Value;
        if (AgainstClaim() >= -Elementary.Log((1 - Reserve) * _plan.Risk))
            return Assize.Outcome.Refuted;

        double green = -Elementary.Log((1 - Reserve) * _plan.Miss);
        _notAbove |= _defectAbove?.LogAtLeast(n, sum) >= green;
        _notBelow |= _defectBelow?.LogAtLeast(n, sum) >= green;
        return _notAbove && _notBelow ? Assize.Outcome.Upheld : null;
    }

    Outcome? AtEnd()
    {
        if (_moments.Trials < _end)
            return null;
        if (_end < LastTrial)
            return Assize.Outcome.Undecided;

        _decidedByLimits = true;
        return _squares.Value >= _limits.AcceptLow && _squares.Value <= _limits.AcceptHigh
            ? Assize.Outcome.Upheld
            : Assize.Outcome.Refuted;
    }

    double AgainstClaim()
    {
        long n = Math.Max(0, _moments.Trials - 1);
        double wide = _tooWide?.LogAtLeast(n, _squares.Value) ?? double.NegativeInfinity;
        double narrow = _tooNarrow?.LogAtLeast(n, _squares.Value) ?? double.NegativeInfinity;
        double greater = Math.Max(wide, narrow), lesser = Math.Min(wide, narrow);
        return _tooWide is null || _tooNarrow is null
            ? greater
            : greater + Elementary.LogOnePlus(Elementary.Exp(lesser - greater)) - LogTwo;
    }

    // By exact limits at every trial, the miss spread over trials as 1/(n(n + 1)), so that it is valid whenever one stops.
    (double Lower, double Upper) Interval()
    {
        long squares = _moments.Trials - 1;
        if (squares < 1)
            return (0, double.PositiveInfinity);

        double share = _plan.Miss / (2.0 * squares * (squares + 1));
        double sum = _squares.Value;
        return (
            Math.Sqrt(sum / ChiSquare.UpperQuantile(squares, share)) * (1 - 1e-9),
            Math.Sqrt(sum / ChiSquare.LowerQuantile(squares, share)) * (1 + 1e-9));
    }

    string Accepts()
    {
        double squares = LastTrial - 1;
        string low = Wording.Number(Math.Sqrt(_limits.AcceptLow / squares));
        return double.IsInfinity(_limits.AcceptHigh)
            ? $"standard deviations from {low} up"
            : $"standard deviations from {low} to {Wording.Number(Math.Sqrt(_limits.AcceptHigh / squares))}";
    }

    static IEnumerable<double> Above(double target, double? defect)
    {
        double first = defect is { } above ? above - target : target;
        for (double distance = first; distance == first || target + distance < Reach * (target + first); distance *= 2)
            yield return target + distance;
    }

    static IEnumerable<double> Below(double target, double? defect)
    {
        double first = defect is > 0 and { } below ? target - below : target / 2;
        for (double distance = first; distance < target; distance *= 2)
            yield return target - distance;
        yield return target / Reach;
    }

    static double[] Right(double target, double edge) => target == edge ? [target] : [target, edge];
}
