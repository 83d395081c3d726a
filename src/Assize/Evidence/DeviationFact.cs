namespace Assize;

/// <summary>Watches whether draws keep to a bound on their standard deviation: what they contradict is refuted for
/// that.</summary>
/// <remarks>Disjoint pairs give y = (x - x′)²/2 of mean Var ≤ σ²; 1 + λ(y - σ²) with λ ≤ 1/(2σ²) is positive and of mean
/// 1 at most.</remarks>
sealed class DeviationFact
{
    readonly double _variance;
    readonly Pot _pot;
    readonly double[] _factors = new double[Pot.Padded(2)];
    double? _first;

    public DeviationFact(double deviation, double logLevel) =>
        (_variance, _pot) = (deviation * deviation, new Pot([0.5, 0.5], logLevel));

    /// <summary>Takes the next draw; whether the bound is refuted.</summary>
    public bool Add(double draw)
    {
        if (_first is not { } first)
        {
            _first = draw;
            return false;
        }

        _first = null;
        double half = (draw - first) * (draw - first) / 2;
        _factors[0] = Factor(0.5, half);
        _factors[1] = Factor(0.05, half);
        return _pot.Play(_factors);
    }

    double Factor(double share, double half) => Math.Min(1 + share * (half / _variance - 1), 1e150);
}
