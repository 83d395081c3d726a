using System.Numerics;

namespace Assize.Tests.Evidence;

/// <summary>The probability that a race is undecided with so many successes, in a window that follows them.</summary>
sealed class Paths
{
    // Mass this small cannot move a probability of 1e-19 in its third digit.
    const double Negligible = 1e-26;
    const int Room = 1 << 14;

    double[] _mass = new double[Room];
    double[] _next = new double[Room];
    long _offset = -Room / 2;
    long _low;
    long _high = -1;

    public Paths(double mass)
    {
        if (mass > 0)
            Put(0, mass);
    }

    public double Total { get; private set; }

    public long Low => _high < _low ? long.MaxValue : _low;

    public long High => _high < _low ? -1 : _high;

    public void Step(double rate)
    {
        if (_high < _low)
            return;

        Centre(_low, _high + 1);
        int from = (int)(_low - _offset), count = (int)(_high - _low + 2);
        _mass[from - 1] = 0;
        _mass[from + count - 1] = 0;
        for (int i = from; i < from + count; i += Vector<double>.Count)
        {
            var here = new Vector<double>(_mass, i) * (1 - rate) + new Vector<double>(_mass, i - 1) * rate;
            here.CopyTo(_next, i);
        }

        Array.Clear(_next, from + count, 2 * Vector<double>.Count);
        (_mass, _next) = (_next, _mass);
        _high++;
        while (_high >= _low && this[_high] < Negligible)
            this[_high--] = 0;
        while (_high >= _low && this[_low] < Negligible)
            this[_low++] = 0;
    }

    public double TakeFrom(long successes)
    {
        double taken = 0;
        for (; _high >= _low && _high >= successes; _high--)
            (taken, this[_high]) = (taken + this[_high], 0);
        Total -= taken;
        return taken;
    }

    public double TakeTo(long successes)
    {
        double taken = 0;
        for (; _high >= _low && _low <= successes; _low++)
            (taken, this[_low]) = (taken + this[_low], 0);
        Total -= taken;
        return taken;
    }

    public void MoveFrom(Paths other, long successes)
    {
        while (_high >= _low && _high >= successes)
            other.Put(_high, TakeFrom(_high));
    }

    public void MoveTo(Paths other, long successes)
    {
        while (_high >= _low && _low <= successes)
            other.Put(_low, TakeTo(_low));
    }

    double this[long successes]
    {
        get => _mass[successes - _offset];
        set => _mass[successes - _offset] = value;
    }

    void Put(long successes, double mass)
    {
        if (_high < _low)
        {
            Array.Clear(_mass);
            (_low, _high) = (successes, successes);
        }

        (_low, _high) = (Math.Min(_low, successes), Math.Max(_high, successes));
        Centre(_low, _high);
        this[successes] += mass;
        Total += mass;
    }

    // The window moves with the count; it is never as wide as half the room.
    void Centre(long low, long high)
    {
        Assert.InRange(high - low, 0, Room / 2);
        if (low - _offset > Room / 8 && high - _offset < Room * 7 / 8)
            return;

        long offset = (low + high) / 2 - Room / 2;
        Array.Clear(_next);
        for (long s = Math.Max(_low, _offset); s <= Math.Min(_high, _offset + Room - 1); s++)
            _next[s - offset] = this[s];
        (_mass, _next, _offset) = (_next, _mass, offset);
    }
}
