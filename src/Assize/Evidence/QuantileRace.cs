using Assize.Bounds;

namespace Assize;

/// <summary>Two races about one value: too many draws below it, or too few up to it. Ties count on either side.</summary>
/// <remarks>
/// Each race has half of the risk and all of the miss: red when one is refuted (union), green when both are upheld (a
/// defect is on one side only, and that side's race passes it with probability miss at most).
/// </remarks>
sealed class QuantileRace(double value, IRace<bool>? below, IRace<bool>? upTo, RatePlan plan) : IRace<double>
{
    long _trials;
    long _below;
    long _upTo;
    long? _notANumber;

    public Outcome? Outcome { get; private set; }

    public void Add(double draw)
    {
        _trials++;
        if (double.IsNaN(draw))
        {
            (_notANumber, Outcome) = (_trials, Assize.Outcome.Refuted);
            return;
        }

        _below += draw < value ? 1 : 0;
        _upTo += draw <= value ? 1 : 0;
        if (below is { Outcome: null })
            below.Add(draw < value);
        if (upTo is { Outcome: null })
            upTo.Add(draw <= value);
        Outcome = Both(below?.Outcome ?? (below is null ? Assize.Outcome.Upheld : null), upTo?.Outcome ?? (upTo is null ? Assize.Outcome.Upheld : null));
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
        var (above, beneath) = (below?.Report(), upTo?.Report());
        var deciding = (below?.Outcome == Assize.Outcome.Refuted ? above : beneath ?? above)!;
        double share = _trials == 0 ? double.NaN : (double)_upTo / _trials;
        string ties = _upTo == _below ? "" : $", {Wording.Count(_below, _trials)} below it";
        return deciding with
        {
            Trials = _trials,
            Observed = share,
            Seen = _trials == 0 ? null : $"{Wording.Count(_upTo, _trials)} up to {Wording.Number(value)}{ties}",
            Interval = RateReport.Interval(_trials, _upTo, plan.Confidence),
            LogEvidenceAgainstClaim = Math.Max(
                above?.LogEvidenceAgainstClaim ?? double.NegativeInfinity,
                beneath?.LogEvidenceAgainstClaim ?? double.NegativeInfinity) - (above is null || beneath is null ? 0 : LogTwo),
            LogEvidenceAgainstDefectBelow = beneath?.LogEvidenceAgainstDefectBelow,
            LogEvidenceAgainstDefectAbove = above?.LogEvidenceAgainstDefectAbove,
            Miss = plan.Miss,
            Cap = Math.Max(above?.Cap ?? 0, beneath?.Cap ?? 0),
            Contradiction = _notANumber is { } trial ? $"trial {Wording.Number(trial)} drew NaN, which is no number" : null,
            Successes = null,
            Counts = new Dictionary<string, double> { ["below"] = _below, ["upTo"] = _upTo },
        };
    }

    const double LogTwo = 0.693147180559945309417;

    static Outcome? Both(Outcome? one, Outcome? other) =>
        one == Assize.Outcome.Refuted || other == Assize.Outcome.Refuted ? Assize.Outcome.Refuted
        : one is null || other is null ? null
        : one == Assize.Outcome.Undecided || other == Assize.Outcome.Undecided ? Assize.Outcome.Undecided
        : Assize.Outcome.Upheld;
}
