namespace Assize;

/// <summary>How much of a walk is at each place of its grid.</summary>
sealed class WalkLayer
{
    const double Negligible = 1e-10;
    const int Spare = 64;

    double[] _mass = new double[Spare];
    double[] _moved = new double[Spare];
    int _least = -Spare / 2;
    int _low;
    int _high = -1;

    public WalkLayer(double mass)
    {
        _mass[-_least] = mass;
        if (mass > 0)
            _high = 0;
    }

    public double Mass
    {
        get
        {
            double sum = 0;
            for (int place = _low; place <= _high; place++)
                sum += _mass[place - _least];
            return sum;
        }
    }

    /// <summary>Spreads every place by the moves, the first of which goes so far.</summary>
    public void Move(ReadOnlySpan<double> moves, int first)
    {
        if (_high < _low)
            return;

        Reserve(_low + first, _high + first + moves.Length - 1);
        var (from, to) = (_mass, _moved);
        Array.Clear(to, _low + first - _least, _high - _low + moves.Length);
        for (int place = _low; place <= _high; place++)
        {
            double mass = from[place - _least];
            var targets = to.AsSpan(place + first - _least, moves.Length);
            for (int k = 0; k < moves.Length; k++)
                targets[k] += mass * moves[k];
        }

        (_mass, _moved) = (to, from);
        (_low, _high) = (_low + first, _high + first + moves.Length - 1);
        while (_high >= _low && _mass[_high - _least] < Negligible)
            _high--;
        while (_high >= _low && _mass[_low - _least] < Negligible)
            _low++;
    }

    /// <summary>Takes out what is at or beyond a limit on either side.</summary>
    public void Drop(int from, int upTo)
    {
        _high = Math.Min(_high, from - 1);
        _low = Math.Max(_low, upTo + 1);
    }

    /// <summary>Hands what is at or beyond a limit on either side to another layer.</summary>
    public void MoveTo(WalkLayer other, int from, int upTo)
    {
        for (; _high >= _low && _high >= from; _high--)
            other.Take(_high, _mass[_high - _least]);
        for (; _high >= _low && _low <= upTo; _low++)
            other.Take(_low, _mass[_low - _least]);
    }

    void Take(int place, double mass)
    {
        if (_high < _low)
            (_low, _high) = (place, place - 1);
        Reserve(Math.Min(place, _low), Math.Max(place, _high));
        for (; _high < place; _high++)
            _mass[_high + 1 - _least] = 0;
        for (; _low > place; _low--)
            _mass[_low - 1 - _least] = 0;
        _mass[place - _least] += mass;
    }

    // The arrays follow the walk: they hold a window, twice as wide as needed, around where it is.
    void Reserve(int low, int high)
    {
        if (low >= _least && high < _least + _mass.Length)
            return;

        int width = high - low + 1;
        int least = low - width / 2 - Spare;
        var wider = new double[2 * (width + Spare)];
        if (_high >= _low)
            Array.Copy(_mass, _low - _least, wider, _low - least, _high - _low + 1);
        (_mass, _moved, _least) = (wider, new double[wider.Length], least);
    }
}
