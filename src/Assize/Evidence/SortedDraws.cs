namespace Assize;

/// <summary>Draws kept in order, each with numbers of its own; new ones are sorted and merged in when they are asked
/// for.</summary>
/// <param name="room">How many draws at most.</param>
/// <param name="numbers">How many numbers a draw carries beside its value.</param>
sealed class SortedDraws(long room, int numbers = 0)
{
    const int FirstRoom = 256;

    double[] _values = [];
    readonly double[][] _numbers = [.. Enumerable.Range(0, numbers).Select(_ => Array.Empty<double>())];
    readonly List<double> _fresh = [];
    int _count;

    public long Count => _count + _fresh.Count;

    public ReadOnlySpan<double> Values => _values.AsSpan(0, _count);

    public ReadOnlySpan<double> Numbers(int which) => _numbers[which].AsSpan(0, _count);

    public void Add(double draw) => _fresh.Add(draw);

    /// <summary>Sorts what is new and merges it in; its numbers are asked for once.</summary>
    public void Settle(Action<double, Span<double>>? numbersOf = null)
    {
        _fresh.Sort();
        Grow(_count + _fresh.Count);
        Span<double> own = stackalloc double[_numbers.Length];
        int to = _count + _fresh.Count - 1, old = _count - 1;
        for (int next = _fresh.Count - 1; next >= 0; to--)
        {
            if (old >= 0 && _values[old] > _fresh[next])
            {
                Move(old--, to);
                continue;
            }

            _values[to] = _fresh[next];
            numbersOf?.Invoke(_fresh[next], own);
            next--;
            for (int which = 0; which < own.Length; which++)
                _numbers[which][to] = own[which];
        }

        _count += _fresh.Count;
        _fresh.Clear();
    }

    void Move(int from, int to)
    {
        _values[to] = _values[from];
        foreach (double[] number in _numbers)
            number[to] = number[from];
    }

    void Grow(int count)
    {
        if (count <= _values.Length)
            return;

        int length = (int)Math.Max(count, Math.Min(room, Math.Max(FirstRoom, 2L * _values.Length)));
        Array.Resize(ref _values, length);
        for (int which = 0; which < _numbers.Length; which++)
            Array.Resize(ref _numbers[which], length);
    }
}
