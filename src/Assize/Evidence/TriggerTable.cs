namespace Assize;

/// <summary>A race's triggers by number of trials: each one at first, later by straight lines between some.</summary>
sealed class TriggerTable(RateStakes stakes)
{
    const long EachUpTo = 512;
    const int KnotsPerOctave = 32;

    readonly List<Triggers> _each = [];
    readonly Dictionary<long, Triggers> _knots = [];
    Triggers _last;

    public RateStakes Stakes => stakes;

    public Triggers At(long trials)
    {
        if (trials > EachUpTo)
            return Between(trials);

        while (_each.Count <= trials)
            _each.Add(_last = stakes.TriggersAt(_each.Count, _last));
        return _each[(int)trials];
    }

    Triggers Between(long trials)
    {
        long spacing = (1L << (int)Math.Log2(trials)) / KnotsPerOctave;
        long first = trials / spacing * spacing;
        double share = (double)(trials - first) / spacing;
        var (start, end) = (Knot(first), Knot(first + spacing));
        long At(long from, long to) => from + (long)Math.Round(share * (to - from));
        return new Triggers(
            At(start.RedFrom, end.RedFrom),
            At(start.RedTo, end.RedTo),
            At(start.NotAboveTo, end.NotAboveTo),
            At(start.NotBelowFrom, end.NotBelowFrom));
    }

    Triggers Knot(long trials)
    {
        if (!_knots.TryGetValue(trials, out var triggers))
            _knots[trials] = triggers = _last = stakes.TriggersAt(trials, _last);
        return triggers;
    }
}
