using Assize.Bounds;

namespace Assize;

/// <summary>Bets on every category beside the trials, and one on all of them together.</summary>
/// <remarks>
/// Half of the money against the claim follows the shares seen so far: its factor is predicted share / (share + tolerance),
/// whose mean, Σ p·predicted/(share + tolerance), is Σ predicted = 1 at most while every p is within its tolerance. The other
/// half is shared by a likelihood ratio on each side of each category. The average is a supermartingale, and Ville's
/// inequality bounds its ever reaching 1/risk. Green when every category's own bet against its defects has reached 1/miss:
/// a defect must beat its own bet, so the miss is not shared. A draw is a category's number; -1 is none of them.
/// </remarks>
sealed class SharesRace : IRace<int>
{
    const string Theorem = "bets on every category, Ville's inequality";
    const double LogTwo = 0.693147180559945309417;

    // A quotient, a product and a sum of exact counts.
    const double FactorUnits = 8;

    readonly ManyStakes _stakes;
    readonly SharesTally _tally;
    readonly IReadOnlyList<int> _kinds;
    readonly double[] _edges;
    readonly long[] _hitsWanted;
    readonly bool[] _isNotAbove;
    readonly bool[] _isNotBelow;
    readonly Deadlines _deadlines;
    readonly Pot _together;
    readonly double[] _factor = new double[Pot.Padded(1)];
    readonly double _redOfOne;
    readonly long _cap;
    int _open;
    bool _decidedAtCap;

    /// <summary>A race before its first trial; an author's cap below the plan's own ends it undecided.</summary>
    public SharesRace(ManyStakes stakes, Func<int, string> name, long? authorCap = null)
    {
        var plan = stakes.Plan;
        int cells = plan.Rates.Count;
        (_stakes, _kinds, _tally) = (stakes, plan.KindOf, new SharesTally(stakes, name));
        _cap = Math.Min(stakes.Trials, authorCap ?? long.MaxValue);
        _redOfOne = stakes.LogRed + LogTwo + Elementary.Log(plan.Sides);
        _together = new Pot([1], stakes.LogRed + LogTwo, FactorUnits);
        _edges = [.. plan.Rates.Select(edges => edges.UpperEdge ?? 1)];
        _hitsWanted = new long[cells];
        _isNotAbove = [.. plan.Rates.Select(edges => edges.UpperDefect is null)];
        _isNotBelow = [.. plan.Rates.Select(edges => edges.LowerDefect is null)];
        _open = _isNotAbove.Count(flag => !flag) + _isNotBelow.Count(flag => !flag);
        _deadlines = new Deadlines(cells);
        for (int cell = 0; cell < cells; cell++)
        {
            TestHits(cell);
            TestMisses(cell);
        }
    }

    public Outcome? Outcome { get; private set; }

    public void Add(int draw)
    {
        if (draw < 0 || _edges[draw] == 0)
        {
            _tally.AddImpossible(draw);
            Outcome = Assize.Outcome.Refuted;
            return;
        }

        _factor[0] = (_tally.Counts[draw] + 1) / ((_tally.Trials + _edges.Length) * _edges[draw]);
        bool red = _together.Play(_factor);
        _tally.Add(draw);
        if (_tally.Counts[draw] >= _hitsWanted[draw])
            red |= TestHits(draw);
        foreach (int due in _deadlines.Take(_tally.Trials))
            red |= TestMisses(due);
        if (red)
            Outcome = Assize.Outcome.Refuted;
        else if (_open == 0)
            Outcome = Assize.Outcome.Upheld;
        else if (_tally.Trials == _cap)
            AtCap();
    }

    public void Add(ReadOnlySpan<int> draws)
    {
        foreach (int draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report() => _decidedAtCap
        ? _tally.Report(_stakes.Plan.Theorem, _cap, _together.LogAtLeast - LogTwo, _stakes.Limits)
        : _tally.Report(Theorem, _cap, _together.LogAtLeast - LogTwo);

    // What gains by hits; misses only lower it, so nothing can happen before so many more hits.
    bool TestHits(int cell)
    {
        var bets = _stakes.Bets[_kinds[cell]];
        long steps = long.MaxValue / 4;
        bool red = Reaches(bets.ClaimFromAbove, cell, _redOfOne, ref steps);
        if (!_isNotBelow[cell])
            Close(_isNotBelow, cell, Reaches(bets.DefectBelow, cell, _stakes.LogGreen, ref steps));
        _hitsWanted[cell] = _tally.Counts[cell] + steps;
        return red;
    }

    // What gains by misses: nothing can happen before so many more trials.
    bool TestMisses(int cell)
    {
        var bets = _stakes.Bets[_kinds[cell]];
        long steps = long.MaxValue / 4;
        bool red = Reaches(bets.ClaimFromBelow, cell, _redOfOne, ref steps);
        if (!_isNotAbove[cell])
            Close(_isNotAbove, cell, Reaches(bets.DefectAbove, cell, _stakes.LogGreen, ref steps));
        if (_tally.Trials + steps <= _cap)
            _deadlines.Add(cell, _tally.Trials + steps);
        return red;
    }

    bool Reaches(Bet? bet, int cell, double level, ref long steps)
    {
        if (bet is null)
            return false;

        var wealth = bet.Wealth(_tally.Trials, _tally.Counts[cell]);
        if (wealth.AtLeast >= level)
            return true;

        steps = Math.Min(steps, bet.StepsTo(level, wealth));
        return false;
    }

    void Close(bool[] flags, int cell, bool reached)
    {
        if (!reached)
            return;

        flags[cell] = true;
        _open--;
    }

    // P(red) ≤ P(race red) + P(limits reject) ≤ 0.9 risk + 0.1 risk, and likewise green: the limits see every draw.
    void AtCap()
    {
        _decidedAtCap = _cap == _stakes.Trials;
        Outcome = !_decidedAtCap ? Assize.Outcome.Undecided
            : _tally.IsWithin(_stakes.Limits) ? Assize.Outcome.Upheld
            : Assize.Outcome.Refuted;
    }
}
