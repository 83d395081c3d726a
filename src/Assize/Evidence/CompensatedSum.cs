namespace Assize;

/// <summary>A sum whose error does not grow with the number of terms (Neumaier's compensation).</summary>
struct CompensatedSum
{
    double _sum;
    double _lost;

    public readonly double Value => _sum + _lost;

    public void Add(double term)
    {
        double sum = _sum + term;
        _lost += Math.Abs(_sum) >= Math.Abs(term) ? _sum - sum + term : term - sum + _sum;
        _sum = sum;
    }
}
