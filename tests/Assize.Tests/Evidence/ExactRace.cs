namespace Assize.Tests.Evidence;

/// <summary>Every path of a race at once: where the count may be, trial by trial, by the race's own tests.</summary>
sealed class ExactRace
{
    // Mass this small cannot move a probability of 1e-20 in its fourth digit.
    const double Negligible = 1e-26;

    readonly RateStakes _stakes;
    readonly double _rate;
    readonly double[][] _alive;
    long _redFrom;
    long _redTo = -1;
    long _aboveTo = -1;
    long _belowFrom;
    long _low;
    long _high;

    ExactRace(RateStakes stakes, double rate)
    {
        (_stakes, _rate) = (stakes, rate);
        int width = (int)Math.Min(stakes.Trials + 2, 4_000_000);
        // 0: no defect excluded, 1: the one above, 2: the one below.
        _alive = [new double[width], new double[width], new double[width]];
        int start = stakes.Bets.DefectAbove is null ? 1 : stakes.Bets.DefectBelow is null ? 2 : 0;
        _alive[start][0] = 1;
    }

    public double Red { get; private set; }

    public double Green { get; private set; }

    public double MeanTrials { get; private set; }

    public static ExactRace Of(RateStakes stakes, double rate)
    {
        var race = new ExactRace(stakes, rate);
        race.Run();
        return race;
    }

    void Run()
    {
        double alive = 1;
        for (long trials = 1; trials <= _stakes.Trials && alive > 1e-16; trials++)
        {
            MeanTrials += alive;
            Move();
            alive = Judge(trials);
            if (trials == _stakes.Trials)
                AtCap();
        }
    }

    void Move()
    {
        _high++;
        foreach (double[] mass in _alive)
        {
            for (long s = _high; s > _low; s--)
                mass[s] = mass[s] * (1 - _rate) + mass[s - 1] * _rate;
            mass[_low] *= 1 - _rate;
        }
    }

    // Limits only grow with the trials, so each is found by walking on from where it was.
    double Judge(long trials)
    {
        while (_redFrom <= trials && !(_redFrom * 2 > trials * _rate && _stakes.Bets.ClaimFromAbove is not null && Refuted(trials, _redFrom, upper: true)))
            _redFrom++;
        while (_stakes.Bets.ClaimFromBelow is not null && _redTo + 1 <= trials && Refuted(trials, _redTo + 1, upper: false))
            _redTo++;
        while (_stakes.Bets.DefectAbove is not null && _aboveTo + 1 <= trials && _stakes.ExcludesAbove(trials, _aboveTo + 1))
            _aboveTo++;
        while (_stakes.Bets.DefectBelow is not null && _belowFrom <= trials && !_stakes.ExcludesBelow(trials, _belowFrom))
            _belowFrom++;
        double alive = 0;
        for (long s = _low; s <= _high; s++)
            alive += JudgeAt(s);
        while (_low < _high && _alive.Sum(mass => mass[_low]) < Negligible)
            Clear(_low++);
        while (_low < _high && _alive.Sum(mass => mass[_high]) < Negligible)
            Clear(_high--);
        return alive;
    }

    bool Refuted(long trials, long successes, bool upper) =>
        _stakes.Refutes(trials, successes) && Leans(trials, successes) == upper;

    // Which of the two bets the wealth comes from.
    bool Leans(long trials, long successes) => _stakes.Bets.ClaimFromBelow is null
        || (_stakes.Bets.ClaimFromAbove is { } above && above.Log(trials, successes) > _stakes.Bets.ClaimFromBelow.Log(trials, successes));

    double JudgeAt(long s)
    {
        bool red = s >= _redFrom || s <= _redTo;
        bool notAbove = s <= _aboveTo, notBelow = _stakes.Bets.DefectBelow is not null && s >= _belowFrom;
        if (red)
            Red += Take(s, 0) + Take(s, 1) + Take(s, 2);
        if (notAbove && notBelow)
            Green += Take(s, 0);
        if (notBelow)
            Green += Take(s, 1);
        if (notAbove)
            Green += Take(s, 2);
        if (notAbove)
            _alive[1][s] += Take(s, 0);
        if (notBelow)
            _alive[2][s] += Take(s, 0);
        return _alive[0][s] + _alive[1][s] + _alive[2][s];
    }

    double Take(long s, int layer)
    {
        double mass = _alive[layer][s];
        _alive[layer][s] = 0;
        return mass;
    }

    void Clear(long s)
    {
        foreach (double[] mass in _alive)
            mass[s] = 0;
    }

    void AtCap()
    {
        for (long s = _low; s <= _high; s++)
        {
            double mass = Take(s, 0) + Take(s, 1) + Take(s, 2);
            if (_stakes.Limits.Accept(s))
                Green += mass;
            else
                Red += mass;
        }
    }
}
