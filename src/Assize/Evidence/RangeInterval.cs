using Assize.Bounds;

namespace Assize;

/// <summary>The predictable plug-in empirical Bernstein interval for draws in a range.</summary>
/// <remarks>
/// With draws and centre on [0, 1], exp(ℓ(x - m) - 4(x - c)²·(-ln(1 - ℓ) - ℓ)/4) has mean 1 at most when m is the mean
/// and ℓ, c are fixed before x. I. Waudby-Smith and A. Ramdas, J. R. Stat. Soc. B 86 (2024) 1, Theorem 2, from memory.
/// </remarks>
sealed class RangeInterval(double minimum, double maximum, double expectedMiss) : MeanInterval
{
    // Wider than the rounding of the sums.
    const double Rounding = 1e-9;

    readonly double _range = maximum - minimum;
    readonly double _log = -2 * Elementary.Log(expectedMiss / 2);
    double _weight = 0.5;
    double _cost = Cost(0.5);
    double _weights;
    double _weighted;
    double _costs;
    Moments _moments;

    public override void Add(double draw)
    {
        double share = (draw - minimum) / _range;
        long trials = _moments.Trials;
        double centre = (0.5 + _moments.Mean * trials) / (trials + 1);
        _weights += _weight;
        _weighted += _weight * share;
        _costs += _cost * (share - centre) * (share - centre);
        _moments.Add(share);
        if (Stretch.EndsAfter(_moments.Trials))
            Size();
    }

    public override (double Lower, double Upper) At(double miss)
    {
        if (_weights == 0)
            return (minimum, maximum);

        double centre = _weighted / _weights;
        double radius = (-Elementary.Log(miss / 2) + _costs) / _weights * (1 + Rounding) + Rounding;
        return (Math.Max(minimum, minimum + (centre - radius) * _range), Math.Min(maximum, minimum + (centre + radius) * _range));
    }

    void Size()
    {
        double next = _moments.Trials + 1;
        double variance = (0.25 + _moments.Squares) / next;
        _weight = Math.Min(0.5, Math.Sqrt(_log / (variance * next * Elementary.Log(1 + next))));
        _cost = Cost(_weight);
    }

    static double Cost(double weight) => -Elementary.LogOnePlus(-weight) - weight;
}
