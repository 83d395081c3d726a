using Assize.Bounds;

namespace Assize;

/// <summary>What is kept of the draws of a mean beside the bets: their moments, an interval, and whether they keep to the
/// facts.</summary>
sealed class MeanRecord(MeanStakes stakes, long cap)
{
    readonly MeanInterval _interval = stakes.Interval(cap);
    readonly DeviationFact? _fact = stakes.Deviation is { } deviation ? new(deviation, stakes.LogFact) : null;
    readonly MeanFacts _facts = stakes.Plan.Facts;
    Moments _moments;
    long? _lastTrial;

    public long Trials => _moments.Trials;

    /// <summary>The fact that a draw broke, or all of them, in words; null while none is.</summary>
    public string? Contradiction { get; private set; }

    /// <summary>Takes the next draw; whether it keeps to the facts.</summary>
    public bool Add(double draw)
    {
        if (!double.IsFinite(draw) || draw < _facts.Minimum || draw > _facts.Maximum)
        {
            _lastTrial = _moments.Trials + 1;
            Contradiction = $"trial {Wording.Number(_lastTrial.Value)} drew {Wording.Exact(draw)}, "
                + (double.IsFinite(draw) ? $"which is not {Wording.Facts(_facts)["draws ".Length..]}" : "which is no number");
            return false;
        }

        _moments.Add(draw);
        _interval.Add(draw);
        if (_fact?.Add(draw) != true)
            return true;

        Contradiction = $"the draws deviate by more than {Wording.Number(stakes.Deviation!.Value)} (standard deviation seen: "
            + $"{Wording.Number(Math.Sqrt(_moments.Squares / (_moments.Trials - 1)))}); were they not, this would happen in "
            + $"{Wording.OnceIn(stakes.Plan.Risk)} at most";
        return false;
    }

    public RaceReport Report(double against, double? below, double? above, string theorem) => new()
    {
        Trials = _moments.Trials,
        LastTrial = _lastTrial,
        Observed = _moments.Trials == 0 ? double.NaN : _moments.Mean,
        Interval = _interval.At(stakes.Plan.Miss),
        LogEvidenceAgainstClaim = against,
        LogEvidenceAgainstDefectBelow = below,
        LogEvidenceAgainstDefectAbove = above,
        Miss = stakes.Plan.Miss,
        Theorem = theorem,
        Cap = cap,
        Contradiction = Contradiction,
        Counts = new Dictionary<string, double>
        {
            ["mean"] = _moments.Mean,
            ["squares"] = _moments.Squares,
        },
    };
}
