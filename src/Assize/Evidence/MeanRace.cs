namespace Assize;

/// <summary>Three bets beside the trials of a mean: one against the claim, one against a defect above, one against a
/// defect below.</summary>
/// <remarks>
/// Truth within tolerance: the bets against both edges are fair, and so is their sum. Truth at the defect above: green
/// needs the bet against it. Both by Ville's inequality, whenever one looks; the cap has its own share.
/// </remarks>
sealed class MeanRace : IRace<double>
{
    const string Theorem = "bets on the mean, Ville's inequality";

    readonly MeanStakes _stakes;
    readonly MeanCap _cap;
    readonly MeanRecord _record;
    readonly long _end;
    readonly MeanBets _claim;
    readonly MeanBets _above;
    readonly MeanBets _below;
    readonly Pot _red;
    readonly Pot _notAbove;
    readonly Pot _notBelow;
    bool _isNotAbove;
    bool _isNotBelow;
    bool _decidedByCap;

    /// <summary>A race before its first trial; an author's cap below its own ends it undecided.</summary>
    public MeanRace(MeanStakes stakes, long? authorCap = null)
    {
        var edges = stakes.Plan.Edges;
        _stakes = stakes;
        _cap = stakes.Cap();
        _end = Math.Min(_cap.Trials, authorCap ?? long.MaxValue);
        _record = new MeanRecord(stakes, _end);
        _claim = stakes.Bets(MeanMember.AgainstClaim(edges, stakes.Reach));
        _above = stakes.Bets(MeanMember.AgainstAbove(edges));
        _below = stakes.Bets(MeanMember.AgainstBelow(edges));
        _red = Of(_claim, stakes.LogRed);
        _notAbove = Of(_above, stakes.LogGreen);
        _notBelow = Of(_below, stakes.LogGreen);
        _isNotAbove = edges.UpperDefect is null;
        _isNotBelow = edges.LowerDefect is null;
    }

    public Outcome? Outcome { get; private set; }

    public void Add(double draw)
    {
        if (!_record.Add(draw))
        {
            Outcome = Assize.Outcome.Refuted;
            return;
        }

        bool red = Play(_claim, _red, draw);
        bool notAbove = !_isNotAbove && Play(_above, _notAbove, draw);
        bool notBelow = !_isNotBelow && Play(_below, _notBelow, draw);
        _isNotAbove |= notAbove;
        _isNotBelow |= notBelow;
        Outcome = red ? Assize.Outcome.Refuted
            : _isNotAbove && _isNotBelow ? Assize.Outcome.Upheld
            : AtCap(draw);
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
        var edges = _stakes.Plan.Edges;
        var report = _record.Report(
            _red.LogAtLeast,
            edges.LowerDefect is null ? null : _notBelow.LogAtLeast,
            edges.UpperDefect is null ? null : _notAbove.LogAtLeast,
            _decidedByCap ? _cap.Theorem : Theorem);
        return _decidedByCap && _record.Trials == _cap.Trials ? report with { Accepts = _cap.Accepts } : report;
    }

    Outcome? AtCap(double draw)
    {
        var outcome = _cap.Add(draw);
        _decidedByCap = outcome is not null;
        return outcome ?? (_record.Trials >= _end ? Assize.Outcome.Undecided : null);
    }

    static bool Play(MeanBets bets, Pot pot, double draw)
    {
        bets.Play(draw);
        return pot.Play(bets.Factors);
    }

    static Pot Of(MeanBets bets, double level) => new(bets.Members.Select(member => member.Weight), level, bets.FactorUnits);
}
