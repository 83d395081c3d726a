using Assize.Bounds;

namespace Assize;

/// <summary>The interval for draws whose standard deviation is bounded: the means that a mixture of bets does not
/// rule out.</summary>
/// <remarks>
/// exp(λS - λ²V/2), S = Σ(x - m), V = Σ((x - m)² + 2σ²)/3, is a nonnegative supermartingale for every λ (B. Delyon, Electron.
/// J. Probab. 14 (2009) 912, from memory); a normal mixture over λ is won when S² ≥ (V + ρ)·ln((V + ρ)/(ρ·miss²)).
/// </remarks>
sealed class DeviationInterval(double deviation, double horizon) : MeanInterval
{
    const double Rounding = 1e-9;

    readonly double _variance = deviation * deviation;
    readonly double _spread = deviation * deviation * horizon;
    Moments _moments;

    public override void Add(double draw) => _moments.Add(draw);

    public override (double Lower, double Upper) At(double miss)
    {
        if (_moments.Trials == 0)
            return (double.NegativeInfinity, double.PositiveInfinity);

        return (End(-1, miss), End(1, miss));
    }

    // Outwards from the average by doubling, then between the last two distances.
    double End(int direction, double miss)
    {
        double step = deviation / Math.Sqrt(_moments.Trials);
        double far = step;
        while (!RuledOut(far, miss))
        {
            far *= 2;
            if (far > 1e30 * step)
                return direction * double.PositiveInfinity;
        }

        double near = far == step ? 0 : far / 2;
        while (far - near > Rounding * far)
        {
            double middle = near + (far - near) / 2;
            if (RuledOut(middle, miss))
                far = middle;
            else
                near = middle;
        }

        return _moments.Mean + direction * far * (1 + Rounding);
    }

    bool RuledOut(double distance, double miss)
    {
        double n = _moments.Trials;
        double sum = n * distance;
        double spread = (_moments.Squares + n * distance * distance + 2 * n * _variance) / 3 + _spread;
        return sum * sum >= spread * (Elementary.Log(spread / _spread) - 2 * Elementary.Log(miss));
    }
}
