namespace Assize.Tests.Evidence;

/// <summary>Every path of a race at once: where the count may be, trial by trial, under the race's own exact
/// tests.</summary>
sealed class ExactRace
{
    readonly RateStakes _stakes;
    readonly double _rate;
    readonly Paths _neither;
    readonly Paths _notAbove;
    readonly Paths _notBelow;
    Chord[] _chords = [];
    Triggers _end;
    long _stretchEnd;

    ExactRace(RateStakes stakes, double rate)
    {
        (_stakes, _rate) = (stakes, rate);
        var (above, below) = (stakes.Bets.DefectAbove, stakes.Bets.DefectBelow);
        _neither = new Paths(above is not null && below is not null ? 1 : 0);
        _notAbove = new Paths(above is null ? 1 : 0);
        _notBelow = new Paths(above is not null && below is null ? 1 : 0);
    }

    Paths[] All => [_neither, _notAbove, _notBelow];

    public double Red { get; private set; }

    public double Green { get; private set; }

    public double MeanTrials { get; private set; }

    public static ExactRace Of(RateStakes stakes, double rate)
    {
        var race = new ExactRace(stakes, rate);
        double alive = 1;
        for (long trials = 1; trials <= stakes.Trials && alive > 1e-16; trials++)
        {
            race.MeanTrials += alive;
            race.Step(trials);
            alive = race._neither.Total + race._notAbove.Total + race._notBelow.Total;
        }

        race.End(alive);
        return race;
    }

    void Step(long trials)
    {
        foreach (var paths in All)
            paths.Step(_rate);
        if (trials > _stretchEnd)
            Stretch(trials - 1);

        long low = All.Min(paths => paths.Low), high = All.Max(paths => paths.High);
        if (_chords[0].Steps(trials, high) == 0)
            Red += Take(Up(high, 0, s => _stakes.Refutes(trials, s)), -1);
        if (_chords[1].Steps(trials, low) == 0)
            Red += Take(long.MaxValue, Down(low, trials, s => _stakes.Refutes(trials, s)));
        // Paths that have excluded a defect stay beyond its trigger: only the others can still cross it.
        low = Math.Min(_neither.Low, _notBelow.Low);
        high = Math.Max(_neither.High, _notAbove.High);
        if (_chords[2].Steps(trials, low) == 0)
            Exclude(Down(low, trials, s => _stakes.ExcludesAbove(trials, s)), long.MaxValue);
        if (_chords[3].Steps(trials, high) == 0)
            Exclude(-1, Up(high, 0, s => _stakes.ExcludesBelow(trials, s)));
    }

    void Exclude(long aboveTo, long belowFrom)
    {
        _neither.MoveTo(_notAbove, aboveTo);
        _neither.MoveFrom(_notBelow, belowFrom);
        Green += _notAbove.TakeFrom(belowFrom) + _notBelow.TakeTo(aboveTo);
    }

    double Take(long from, long to) => All.Sum(paths => paths.TakeFrom(from) + paths.TakeTo(to));

    void Stretch(long first)
    {
        long last = Math.Min(_stakes.Trials, first + Math.Max(16, first / 64));
        var start = _stakes.TriggersAt(first, _end);
        _end = _stakes.TriggersAt(last, start);
        _stretchEnd = last;
        _chords =
        [
            Chord.Upper(first, last, start.RedFrom, _end.RedFrom),
            Chord.Lower(first, last, start.RedTo, _end.RedTo),
            Chord.Lower(first, last, start.NotAboveTo, _end.NotAboveTo),
            Chord.Upper(first, last, start.NotBelowFrom, _end.NotBelowFrom),
        ];
    }

    // What is left at the cap is judged by the limits.
    void End(double alive)
    {
        if (alive <= 1e-16)
            return;

        Red += Take(_stakes.Limits.AcceptHigh + 1, _stakes.Limits.AcceptLow - 1);
        Green += Take(0, -1);
    }

    // From the rim of the window inwards, as long as the exact test says yes.
    static long Up(long high, long least, Func<long, bool> holds)
    {
        while (high >= least && holds(high))
            high--;
        return high + 1;
    }

    static long Down(long low, long most, Func<long, bool> holds)
    {
        while (low <= most && holds(low))
            low++;
        return low - 1;
    }
}
