namespace Assize;

/// <summary>Three bets beside the trials of a rate: one against the claim, one against a defect above, one against a
/// defect below.</summary>
/// <remarks>
/// Ville's inequality bounds the chance that a nonnegative supermartingale starting at 1 ever reaches 1/q by q, whenever
/// one looks. The verdict is that of the first trial at which one stands; it does not depend on how trials are grouped.
/// </remarks>
sealed class RateRace : IRace<bool>
{
    const long ShortStretch = 64;
    const string Theorem = "likelihood-ratio bets, Ville's inequality";

    readonly RateStakes _stakes;
    readonly long _cap;
    bool _notAbove;
    bool _notBelow;
    bool _decidedAtCap;
    long _trials;
    long _successes;
    long _nextLook;
    long _stretchEnd;
    long _stretchLength = ShortStretch;
    Triggers _triggers;
    Chord _redFrom;
    Chord _redTo;
    Chord _notAboveTo;
    Chord _notBelowFrom;

    /// <summary>A race before its first trial; an author's cap below the plan's own ends it undecided.</summary>
    public RateRace(RateStakes stakes, long? authorCap = null)
    {
        _stakes = stakes;
        _cap = Math.Min(stakes.Trials, authorCap ?? long.MaxValue);
        _notAbove = stakes.Bets.DefectAbove is null;
        _notBelow = stakes.Bets.DefectBelow is null;
        Stretch();
        _nextLook = NextLook();
    }

    public Outcome? Outcome { get; private set; }

    public long Quiet => _nextLook - _trials;

    public void Add(bool draw)
    {
        if (draw)
            _successes++;
        if (++_trials == _nextLook)
            Look();
    }

    // Before the next look no count can reach a trigger, in whatever order the draws come: counting them is enough.
    public void Add(ReadOnlySpan<bool> draws)
    {
        while (!draws.IsEmpty && Outcome is null)
        {
            int quiet = (int)Math.Min(draws.Length, _nextLook - _trials);
            _successes += draws[..quiet].Count(true);
            _trials += quiet;
            draws = draws[quiet..];
            if (_trials == _nextLook)
                Look();
        }
    }

    public RaceReport Report()
    {
        var (plan, limits) = (_stakes.Plan, _stakes.Limits);
        string theorem = _decidedAtCap ? plan.Theorem : Theorem;
        var report = RateReport.Of(plan, _stakes.Bets, _trials, _successes, theorem, _cap);
        return _decidedAtCap ? report with { Accepts = Wording.Counts(limits) } : report;
    }

    void Look()
    {
        if (Steps() == 0)
            Test();
        if (Outcome is null && _trials == _cap)
            AtCap();
        if (Outcome is null)
            _nextLook = NextLook();
    }

    long NextLook()
    {
        if (_trials == _stretchEnd)
            Stretch();
        return _trials + Math.Clamp(Steps(), 1, _stretchEnd - _trials);
    }

    long Steps() => Math.Min(
        Math.Min(_redFrom.Steps(_trials, _successes), _redTo.Steps(_trials, _successes)),
        Math.Min(_notAboveTo.Steps(_trials, _successes), _notBelowFrom.Steps(_trials, _successes)));

    // The exact test, in the order that decides between verdicts that come true together. Flags stick.
    void Test()
    {
        if (_stakes.Refutes(_trials, _successes))
        {
            Outcome = Assize.Outcome.Refuted;
            return;
        }

        bool notAbove = _notAbove || _stakes.ExcludesAbove(_trials, _successes);
        bool notBelow = _notBelow || _stakes.ExcludesBelow(_trials, _successes);
        if (notAbove && notBelow)
            Outcome = Assize.Outcome.Upheld;
        else if (notAbove != _notAbove || notBelow != _notBelow)
            (_notAbove, _notBelow, _stretchEnd) = (notAbove, notBelow, _trials);
        else if (_stretchEnd - _trials > ShortStretch)
            // The chord was too far from its curve: shorter ones lie closer.
            (_stretchLength, _stretchEnd) = (ShortStretch / 2, _trials);
    }

    // P(red) ≤ P(race red) + P(limits reject) ≤ 0.9 risk + 0.1 risk, and likewise green: the limits see every draw.
    void AtCap()
    {
        _decidedAtCap = _cap == _stakes.Trials;
        Outcome = !_decidedAtCap ? Assize.Outcome.Undecided
            : _stakes.Limits.Accept(_successes) ? Assize.Outcome.Upheld
            : Assize.Outcome.Refuted;
    }

    void Stretch()
    {
        long first = _trials;
        _stretchLength = Math.Min(2 * _stretchLength, Math.Max(ShortStretch, first));
        long last = Math.Min(first + _stretchLength, _cap);
        _stretchEnd = last;
        var start = _stakes.TriggersAt(first, _triggers);
        var end = _stakes.TriggersAt(last, start);
        _triggers = end;
        _redFrom = Chord.Upper(first, last, start.RedFrom, end.RedFrom);
        _redTo = Chord.Lower(first, last, start.RedTo, end.RedTo);
        _notAboveTo = _notAbove ? default : Chord.Lower(first, last, start.NotAboveTo, end.NotAboveTo);
        _notBelowFrom = _notBelow ? default : Chord.Upper(first, last, start.NotBelowFrom, end.NotBelowFrom);
    }
}
