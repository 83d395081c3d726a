using Assize.Bounds;

namespace Assize;

/// <summary>The mean length of a race, by carrying forward where the count of successes may be.</summary>
/// <remarks>
/// A step of several trials moves the count by the binomial itself where its spread is small, else by a three-point law
/// of the same mean and variance; limits are then drawn in by half a place, the mean overshoot on such a grid.
/// </remarks>
sealed class RaceWalk
{
    const long CoarseSteps = 500;
    const long FineSteps = 700;
    const double Negligible = 1e-6;
    const double WideVariance = 1;
    const int Far = 1_000_000_000;

    readonly TriggerTable _table;
    readonly RateStakes _stakes;
    readonly double _rate;
    readonly long _stride;
    readonly double _grid = 1;
    readonly double[] _moves;
    readonly WalkLayer _neither;
    readonly WalkLayer _notAbove;
    readonly WalkLayer _notBelow;

    RaceWalk(TriggerTable table, double rate, long stride)
    {
        (_table, _stakes, _rate, _stride) = (table, table.Stakes, rate, stride);
        double variance = stride * rate * (1 - rate);
        bool isWide = variance > WideVariance;
        if (isWide)
            _grid = Math.Sqrt(3 * variance);
        _moves = isWide ? [1.0 / 6, 2.0 / 3, 1.0 / 6] : Binomials();
        var (above, below) = (_stakes.Bets.DefectAbove, _stakes.Bets.DefectBelow);
        _notAbove = new WalkLayer(above is null ? 1 : 0);
        _notBelow = new WalkLayer(above is not null && below is null ? 1 : 0);
        _neither = new WalkLayer(above is not null && below is not null ? 1 : 0);
    }

    bool IsWide => _grid > 1;

    /// <summary>The mean number of trials until the verdict: a coarse walk tells how fine the second must
    /// be.</summary>
    public static double MeanTrials(TriggerTable table, double rate)
    {
        long coarse = Math.Max(1, table.Stakes.Trials / CoarseSteps);
        double mean = new RaceWalk(table, rate, coarse).Mean();
        long fine = Math.Max(1, (long)(mean / FineSteps));
        return fine < coarse ? new RaceWalk(table, rate, fine).Mean() : mean;
    }

    double Mean()
    {
        double mean = 0;
        for (long trials = 0; trials < _stakes.Trials;)
        {
            double alive = _neither.Mass + _notAbove.Mass + _notBelow.Mass;
            if (alive < Negligible)
                break;

            long step = Math.Min(_stride, _stakes.Trials - trials);
            mean += alive * step;
            trials += step;
            foreach (var layer in (ReadOnlySpan<WalkLayer>)[_neither, _notAbove, _notBelow])
                layer.Move(_moves, IsWide ? -1 : 0);
            Judge(trials, _table.At(trials));
        }

        return mean;
    }

    void Judge(long trials, Triggers triggers)
    {
        int redFrom = Reaching(trials, triggers.RedFrom);
        int redTo = Falling(trials, triggers.RedTo);
        foreach (var layer in (ReadOnlySpan<WalkLayer>)[_neither, _notAbove, _notBelow])
            layer.Drop(redFrom, redTo);

        int aboveTo = Falling(trials, triggers.NotAboveTo);
        int belowFrom = Reaching(trials, triggers.NotBelowFrom);
        _neither.MoveTo(_notAbove, int.MaxValue, aboveTo);
        _neither.MoveTo(_notBelow, belowFrom, int.MinValue);
        _notAbove.Drop(belowFrom, int.MinValue);
        _notBelow.Drop(int.MaxValue, aboveTo);
    }

    // The place on the grid of a limit that is reached from below, or from above; one that no count reaches is far away,
    // for the steps of the grid may lead beyond what can be counted.
    int Reaching(long trials, long successes) =>
        successes > trials ? Far : (int)Math.Clamp(Math.Ceiling(Place(trials, successes, -0.5)), -Far, Far);

    int Falling(long trials, long successes) =>
        successes < 0 ? -Far : (int)Math.Clamp(Math.Floor(Place(trials, successes, 0.5)), -Far, Far);

    double Place(long trials, long successes, double drawnIn) =>
        IsWide ? (successes - trials * _rate) / _grid + drawnIn : successes;

    double[] Binomials()
    {
        var moves = new List<double>();
        for (long k = 0; k <= _stride; k++)
        {
            double mass = Binomial.Mass(_stride, k, _rate);
            if (k > _stride * _rate && mass < Negligible / 1000)
                break;

            moves.Add(mass);
        }

        return [.. moves];
    }
}
