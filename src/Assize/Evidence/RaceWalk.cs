using Assize.Bounds;

namespace Assize;

/// <summary>The distribution of a race's length by carrying forward where the count of successes may be.</summary>
/// <remarks>
/// Steps of several trials move the count by a three-point law of the same mean and variance, or by the binomial itself where
/// successes are rare; limits are drawn in by half a grid step, the mean overshoot of such a walk.
/// </remarks>
sealed class RaceWalk
{
    const int Steps = 4_000;
    const double Negligible = 1e-9;

    readonly RateStakes _stakes;
    readonly double _rate;
    readonly long _stride;
    readonly double _grid;
    readonly double[] _moves;
    Triggers? _limits;

    public RaceWalk(RateStakes stakes, double rate)
    {
        (_stakes, _rate) = (stakes, rate);
        _stride = Math.Max(1, (stakes.Trials + Steps - 1) / Steps);
        double variance = _stride * rate * (1 - rate);
        bool coarse = variance > 4;
        _grid = coarse ? Math.Sqrt(3 * variance) : 1;
        _moves = coarse ? [1.0 / 6, 2.0 / 3, 1.0 / 6] : Binomials();
    }

    bool IsCoarse => _grid > 1;

    /// <summary>The mean number of trials until the verdict.</summary>
    public double Mean()
    {
        // One array for each of: neither defect excluded, the one above, the one below.
        bool none = _stakes.Bets.DefectAbove is not null && _stakes.Bets.DefectBelow is not null;
        var both = new WalkLayer(none ? 1 : 0);
        var notAbove = new WalkLayer(!none && _stakes.Bets.DefectAbove is null ? 1 : 0);
        var notBelow = new WalkLayer(!none && _stakes.Bets.DefectAbove is not null ? 1 : 0);
        double mean = 0;
        for (long trials = 0; trials < _stakes.Trials;)
        {
            double alive = both.Mass + notAbove.Mass + notBelow.Mass;
            if (alive < Negligible)
                break;

            long step = Math.Min(_stride, _stakes.Trials - trials);
            mean += alive * step;
            trials += step;
            both.Move(_moves, IsCoarse);
            notAbove.Move(_moves, IsCoarse);
            notBelow.Move(_moves, IsCoarse);
            Judge(trials, both, notAbove, notBelow);
        }

        return mean;
    }

    void Judge(long trials, WalkLayer both, WalkLayer notAbove, WalkLayer notBelow)
    {
        var limits = _limits = _stakes.Close(trials, _limits);
        int redFrom = FromBelow(trials, limits.RedFrom), redTo = FromAbove(trials, limits.RedTo);
        foreach (var layer in (WalkLayer[])[both, notAbove, notBelow])
            layer.Drop(redFrom, redTo);

        int aboveTo = _stakes.Bets.DefectAbove is null ? int.MaxValue : FromAbove(trials, limits.NotAboveTo);
        int belowFrom = _stakes.Bets.DefectBelow is null ? int.MinValue : FromBelow(trials, limits.NotBelowFrom);
        both.MoveTo(notAbove, upTo: aboveTo);
        both.MoveTo(notBelow, from: belowFrom);
        notAbove.Drop(belowFrom, int.MinValue);
        notBelow.Drop(int.MaxValue, aboveTo);
    }

    // The place on the grid of a limit that is reached from below, or from above.
    int FromBelow(long trials, long successes) => (int)Math.Clamp(Math.Ceiling(Place(trials, successes, -0.5)), -1e9, 1e9);

    int FromAbove(long trials, long successes) => (int)Math.Clamp(Math.Floor(Place(trials, successes, 0.5)), -1e9, 1e9);

    double Place(long trials, long successes, double drawnIn) =>
        IsCoarse ? (successes - trials * _rate) / _grid + drawnIn : successes;

    double[] Binomials()
    {
        var moves = new List<double>();
        for (long k = 0; k <= _stride; k++)
        {
            double mass = Binomial.Mass(_stride, k, _rate);
            if (k > _stride * _rate && mass < Negligible / Steps)
                break;

            moves.Add(mass);
        }

        return [.. moves];
    }
}
