namespace Assize;

/// <summary>How much of a walk is at each place, still alive.</summary>
sealed class WalkLayer
{
    const double Negligible = 1e-15;

    // The places from _low to _high, from the start of the array on; the other array takes the next move.
    double[] _mass = new double[64];
    double[] _moved = new double[64];
    int _low;
    int _high = -1;

    public WalkLayer(double mass)
    {
        if (mass > 0)
            (_mass[0], _high) = (mass, 0);
    }

    public double Mass
    {
        get
        {
            double sum = 0;
            for (int i = 0; i <= _high - _low; i++)
                sum += _mass[i];
            return sum;
        }
    }

    /// <summary>Spreads every place over its neighbours: around it, or from it upwards.</summary>
    public void Move(double[] moves, bool centred)
    {
        if (_high < _low)
            return;

        int width = _high - _low + 1;
        int wider = width + moves.Length - 1;
        if (_moved.Length < wider)
            _moved = new double[2 * wider];
        Array.Clear(_moved, 0, wider);
        for (int i = 0; i < width; i++)
        {
            for (int k = 0; k < moves.Length; k++)
                _moved[i + k] += _mass[i] * moves[k];
        }

        (_mass, _moved) = (_moved, _mass);
        _low += centred ? -(moves.Length / 2) : 0;
        _high = _low + wider - 1;
        Keep(place => _mass[place - _low] >= Negligible);
    }

    /// <summary>Takes out what is at or beyond a limit on either side.</summary>
    public void Drop(int from, int upTo) => Keep(place => place < from && place > upTo);

    /// <summary>Hands what is at or beyond a limit on one side to another layer.</summary>
    public void MoveTo(WalkLayer other, int from = int.MaxValue, int upTo = int.MinValue)
    {
        for (int place = _low; place <= _high; place++)
        {
            if (place >= from || place <= upTo)
                other.Take(place, _mass[place - _low]);
        }

        Drop(from, upTo);
    }

    // Shortens the range from both ends to where something is kept.
    void Keep(Func<int, bool> kept)
    {
        int low = _low, high = _high;
        while (high >= low && !kept(high))
            high--;
        while (low <= high && !kept(low))
            low++;
        if (low > _low && high >= low)
            Array.Copy(_mass, low - _low, _mass, 0, high - low + 1);
        (_low, _high) = (low, high);
    }

    void Take(int place, double mass)
    {
        if (_high < _low)
            (_low, _high, _mass[0]) = (place, place, 0);
        int low = Math.Min(_low, place), high = Math.Max(_high, place);
        if (low < _low || high > _high)
        {
            var wider = new double[2 * (high - low + 1)];
            Array.Copy(_mass, 0, wider, _low - low, _high - _low + 1);
            (_mass, _low, _high) = (wider, low, high);
        }

        _mass[place - _low] += mass;
    }
}
