namespace Assize.Bounds;

/// <summary>Which numbers of trials catch one side's defect, though their miss goes up and down like a saw.</summary>
/// <remarks>
/// Numbers of trials fall into runs within which either the limit, or the distance between trials and limit, stays
/// the same and
/// the miss is monotone: a run is settled by its ends. Below the first run to look at, and above the last, one
/// monotone bound
/// settles everything (see <see cref="RateSide.SmoothedMiss"/>).
/// </remarks>
sealed class RateSearch
{
    // Well above rounding, well below anything that would widen the search.
    const double Slack = 1e-9;

    // The finer, the fewer runs are left to look at one by one; a block costs as much as a few runs.
    const int Fineness = 4096;

    // Only a two-sided claim of a great risk gets there; from then on a doubtful number counts as failing.
    const int MostLooks = 20_000;

    readonly RateSide _side;
    readonly RateSide? _opposite;
    readonly double _miss;
    readonly double _redAnyway;
    readonly double _leastRedAnyway;
    readonly long _certified;
    readonly bool _limitStays;
    int _looks;

    public RateSearch(RateSide side, RateSide? opposite, double miss)
    {
        _side = side;
        _opposite = opposite;
        _miss = miss;
        _limitStays = side.LimitStays;
        Proven = ChernoffTrials.Ceiling(side, miss) ?? throw RatePlan.TooManyTrials();
        Proven++;
        (Floor, _redAnyway) = Foundation(opposite?.Risk ?? 0);
        _certified = CertifiedFrom();
        _leastRedAnyway = LeastRedAnyway(Floor, _certified);
    }

    /// <summary>No smaller number of trials works.</summary>
    public long Floor { get; }

    /// <summary>Every number of trials from here on works, by Chernoff's bound.</summary>
    public long Proven { get; }

    /// <summary>The last number of trials that fails, 0 if none does.</summary>
    public long LastFailing()
    {
        long trials = _certified - 1;
        if (trials < Floor)
            return Math.Max(0, Floor - 1);

        long limit = _side.Limit(trials);
        for (long length = 1; trials >= Floor;)
        {
            long start = RunStart(trials, limit, length);
            if (LastFailingInRun(start, trials, limit) is { } failing)
                return failing;

            // One trial back the limit is one less, or else stays while its distance from the trials is one less.
            length = trials - start + 1;
            limit -= _limitStays ? 1 : length - 1;
            trials = start - 1;
        }

        return Math.Max(0, Floor - 1);
    }

    /// <summary>The first number of trials that works, from the given one on.</summary>
    public long NextWorking(long trials)
    {
        if (trials >= _certified)
            return trials;

        long limit = _side.Limit(trials);
        for (long length = 1; trials < _certified;)
        {
            long end = RunEnd(trials, limit, length);
            if (FirstWorkingInRun(trials, end, limit) is { } working)
                return working;

            // One trial on the limit is one more, or else stays while its distance from the trials is one more.
            length = end - trials + 1;
            limit += _limitStays ? 1 : length - 1;
            trials = end + 1;
        }

        return trials;
    }

    public bool Works(long trials)
    {
        double missed = _side.Missed(trials, _side.Limit(trials));
        return Surely(missed) || (Maybe(missed) && Surely(missed - RedAnyway(trials)));
    }

    bool Surely(double missed) => RateSide.Within(missed, _miss);

    // From the floor to the certified trials only.
    bool SurelyHere(double missed) => Surely(missed - _leastRedAnyway);

    bool Maybe(double missed) => missed <= (_miss + _redAnyway) * (1 + Slack);

    // What the opposite limit may refuse at most falls as the floor rises, and the floor rises as that falls.
    (long Floor, double RedAnyway) Foundation(double redAnyway)
    {
        long floor = FirstPossible(Aim((long)(0.8 * Proven), redAnyway), redAnyway);
        while (_opposite is not null)
        {
            redAnyway = _opposite.SmoothedRed(floor, _opposite.Risk, _side.Defect);
            long higher = FirstPossible(floor, redAnyway);
            if (higher <= floor)
                break;

            floor = higher;
        }

        return (floor, redAnyway);
    }

    long FirstPossible(long guess, double redAnyway) => IntegerSearch.First(
        1, Proven, guess, trials => _side.SmoothedMiss(trials, _side.Risk) <= (_miss + redAnyway) * (1 + Slack));

    // The logarithm of the miss is nearly straight in the trials: a few chords come close, and the search does the rest.
    long Aim(long trials, double redAnyway)
    {
        double allowed = Elementary.Log(_miss + redAnyway);
        double here = Elementary.Log(_side.SmoothedMiss(trials, _side.Risk)) - allowed;
        long next = Math.Max(1, trials - trials / 16);
        for (int chord = 0; chord < 4 && next != trials; chord++)
        {
            double there = Elementary.Log(_side.SmoothedMiss(next, _side.Risk)) - allowed;
            double step = there * (next - trials) / (there - here);
            if (!(Math.Abs(step) < Proven))
                break;

            (trials, here) = (next, there);
            next = Math.Max(1, Math.Min(Proven, next - (long)step));
        }

        return next;
    }

    double RedAnyway(long trials) =>
        _opposite?.TailBeyond(trials, _opposite.Limit(trials), _side.Defect) ?? 0;

    // At this defect the opposite limit turns some verdicts red as well: at least so many, wherever in the block.
    double LeastRedAnyway(long first, long last)
    {
        if (_opposite is null)
            return 0;

        double level = LeastLevel(_opposite, first, last);
        return level > 0 ? _opposite.SmoothedRed(last, level, _side.Defect) * (1 - Slack) : 0;
    }

    // Downwards from Chernoff's number, in blocks that one evaluation settles.
    long CertifiedFrom()
    {
        long trials = Proven;
        long stride = (Proven - Floor) / 2;
        while (stride > (trials - Floor) / Fineness && stride * Math.Min(_side.CountedRate, 1 - _side.CountedRate) > 4)
        {
            if (trials - stride >= Floor && Certified(trials - stride, trials))
                trials -= stride;
            else
                stride /= 2;
        }

        return trials;
    }

    // In the block, the plain test's level is above risk · (1 - hazard): it misses less than the smoothed test of
    // that level.
    bool Certified(long first, long last)
    {
        double level = LeastLevel(_side, first, last);
        if (!(level > 0))
            return false;

        double missed = _side.SmoothedMiss(first, level);
        return missed <= _miss * (1 - Slack)
            || (Maybe(missed) && missed <= (_miss + LeastRedAnyway(first, last)) * (1 - Slack));
    }

    static double LeastLevel(RateSide side, long first, long last) =>
        side.Risk * (1 - side.MostHazard(first, last)) * (1 - Slack);

    long RunStart(long trials, long limit, long length)
    {
        long guess = trials - length + 1;
        if (_limitStays)
            return limit == 0 ? 1 : IntegerSearch.First(1, trials, guess, n => !Allowed(n, limit - 1));

        long apart = trials - limit;
        return IntegerSearch.First(Math.Max(1, apart), trials, guess, n => Allowed(n, n - apart));
    }

    long RunEnd(long trials, long limit, long length)
    {
        long apart = trials - limit;
        bool Ended(long n) => _limitStays ? !Allowed(n, limit) : Allowed(n, n - apart - 1);
        return IntegerSearch.First(trials + 1, Proven, trials + length, Ended) - 1;
    }

    bool Allowed(long trials, long limit) => RateSide.Within(_side.Beyond(trials, limit), _side.Risk);

    long? LastFailingInRun(long start, long end, long limit)
    {
        long last = _limitStays
            ? IntegerSearch.First(start, end, start, n => SurelyHere(_side.Missed(n, limit))) - 1
            : end;
        for (long trials = last; trials >= start; trials--)
        {
            double missed = _side.Missed(trials, _limitStays ? limit : limit - (end - trials));
            if (!_limitStays && SurelyHere(missed))
                return null;
            if (!Maybe(missed) || ++_looks > MostLooks || !Works(trials))
                return trials;
        }

        return null;
    }

    long? FirstWorkingInRun(long start, long end, long limit)
    {
        long first = _limitStays
            ? IntegerSearch.First(start, end, end, n => Maybe(_side.Missed(n, limit)))
            : start;
        for (long trials = first; trials <= end; trials++)
        {
            if (++_looks > MostLooks)
                return FirstSureInRun(trials, end, limit + (_limitStays ? 0 : trials - start));
            if (!_limitStays && !Maybe(_side.Missed(trials, limit + (trials - start))))
                return null;
            if (Works(trials))
                return trials;
        }

        return null;
    }

    long? FirstSureInRun(long start, long end, long limit)
    {
        if (!_limitStays)
            return Surely(_side.Missed(start, limit)) ? start : null;

        long first = IntegerSearch.First(start, end, end, n => Surely(_side.Missed(n, limit)));
        return first <= end ? first : null;
    }
}
