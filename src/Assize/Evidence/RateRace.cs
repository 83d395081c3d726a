namespace Assize;

/// <summary>Three bets beside the trials of a rate: one against the claim, one against a defect above, one against a defect below.</summary>
/// <remarks>
/// Ville's inequality bounds the chance that a nonnegative supermartingale starting at 1 ever reaches 1/q by q, whenever one looks.
/// The verdict is that of the first trial at which one stands; it does not depend on how trials are grouped into blocks.
/// </remarks>
sealed class RateRace : IRace<bool>
{
    readonly RateStakes _stakes;
    readonly double _confidence;
    readonly long _cap;
    readonly bool _mayDecideAtCap;
    bool _notAbove;
    bool _notBelow;
    bool _decidedAtCap;
    long _trials;
    long _successes;
    long _stretchEnd;
    long _redFrom;
    long _redTo;
    long _greenTo;
    long _greenFrom;

    /// <summary>A race before its first trial; an author's cap below the plan's own ends it undecided.</summary>
    public RateRace(RateStakes stakes, double confidence, long? authorCap)
    {
        (_stakes, _confidence) = (stakes, confidence);
        _cap = Math.Min(stakes.Trials, authorCap ?? long.MaxValue);
        _mayDecideAtCap = _cap == stakes.Trials;
        _notAbove = stakes.Bets.DefectAbove is null;
        _notBelow = stakes.Bets.DefectBelow is null;
        Stretch();
    }

    public Outcome? Outcome { get; private set; }

    public void Add(bool draw)
    {
        if (draw)
            _successes++;
        if (++_trials >= _stretchEnd)
            Stretch();
        if (_successes >= _redFrom || _successes <= _redTo || _successes <= _greenTo || _successes >= _greenFrom)
            Outcome = Test();
        if (_trials == _cap && Outcome is null)
            AtCap();
    }

    public RaceReport Report() => RateReport.Of(
        _stakes.Bets, _trials, _successes, _confidence, _decidedAtCap ? "exact binomial" : "likelihood-ratio bets, Ville's inequality", _cap);

    // The exact test, in the order that decides between verdicts that come true together.
    Outcome? Test()
    {
        if (_stakes.Refutes(_trials, _successes))
            return Assize.Outcome.Refuted;

        bool notAbove = _notAbove || _stakes.ExcludesAbove(_trials, _successes);
        bool notBelow = _notBelow || _stakes.ExcludesBelow(_trials, _successes);
        if (notAbove && notBelow)
            return Assize.Outcome.Upheld;
        if (notAbove == _notAbove && notBelow == _notBelow)
            return null;

        (_notAbove, _notBelow) = (notAbove, notBelow);
        Stretch();
        return null;
    }

    // P(red) ≤ P(race red) + P(limits reject) ≤ 0.9 risk + 0.1 risk, and likewise green: the limits see every draw, unconditionally.
    void AtCap()
    {
        _decidedAtCap = _mayDecideAtCap;
        Outcome = !_mayDecideAtCap ? Assize.Outcome.Undecided
            : _stakes.Limits.Accept(_successes) ? Assize.Outcome.Upheld : Assize.Outcome.Refuted;
    }

    // Each limit only grows with the trials, so those that matter for a stretch are the least and greatest at its ends.
    void Stretch()
    {
        long first = Math.Max(1, _trials);
        long last = first + Math.Clamp(first / 8, 16, 8192);
        _stretchEnd = last + 1;
        var (atFirst, atLast) = (_stakes.Loose(first), _stakes.Loose(last));
        (_redFrom, _redTo) = (atFirst.RedFrom, atLast.RedTo);
        _greenTo = _notAbove ? -1 : atLast.NotAboveTo;
        _greenFrom = _notBelow ? long.MaxValue : atFirst.NotBelowFrom;
    }
}
