using Assize.Bounds;

namespace Assize;

/// <summary>The distribution of a race's length by carrying forward where the count of successes may be.</summary>
/// <remarks>
/// Steps of several trials move the count by a three-point law of the same mean and variance, or by the binomial itself where
/// successes are rare; limits are drawn in by half a grid step, the mean overshoot of such a walk.
/// </remarks>
sealed class RaceWalk
{
    const int Steps = 20_000;
    const double Negligible = 1e-9;

    readonly RateStakes _stakes;
    readonly double _rate;
    readonly long _stride;
    readonly double _grid;
    readonly double[] _moves;

    public RaceWalk(RateStakes stakes, double rate)
    {
        (_stakes, _rate) = (stakes, rate);
        long length = stakes.Trials == long.MaxValue ? ZeroLength(stakes) : stakes.Trials;
        _stride = Math.Max(1, (length + Steps - 1) / Steps);
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
        var both = new Layer(none ? 1 : 0);
        var notAbove = new Layer(!none && _stakes.Bets.DefectAbove is null ? 1 : 0);
        var notBelow = new Layer(!none && _stakes.Bets.DefectAbove is not null ? 1 : 0);
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

    void Judge(long trials, Layer both, Layer notAbove, Layer notBelow)
    {
        int redFrom = FromBelow(trials, _stakes.RedFrom(trials)), redTo = FromAbove(trials, _stakes.RedTo(trials));
        foreach (var layer in (Layer[])[both, notAbove, notBelow])
            layer.Drop(redFrom, redTo);

        int aboveTo = _stakes.Bets.DefectAbove is null ? int.MaxValue : FromAbove(trials, _stakes.ExcludesAboveTo(trials));
        int belowFrom = _stakes.Bets.DefectBelow is null ? int.MinValue : FromBelow(trials, _stakes.ExcludesBelowFrom(trials));
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

    // Without a cap the green limit is the length: no failure in that many trials.
    static long ZeroLength(RateStakes stakes)
    {
        var bet = stakes.Bets.DefectAbove ?? stakes.Bets.DefectBelow!;
        double green = -Elementary.Log(stakes.Miss);
        long trials = 1;
        while (trials < RatePlan.MaximumTrials && Math.Max(bet.Log(trials, 0), bet.Log(trials, trials)) < green)
            trials *= 2;
        return trials;
    }

    /// <summary>How much of the walk is at each place, alive.</summary>
    sealed class Layer
    {
        double[] _mass = new double[64];
        int _least = -16;
        int _low;
        int _high;

        public Layer(double mass)
        {
            _mass[-_least] = mass;
            (_low, _high) = (0, mass > 0 ? 0 : -1);
        }

        public double Mass
        {
            get
            {
                double sum = 0;
                for (int place = _low; place <= _high; place++)
                    sum += _mass[place - _least];
                return sum;
            }
        }

        public void Move(double[] moves, bool centred)
        {
            if (_high < _low)
                return;

            int first = centred ? -(moves.Length / 2) : 0;
            Reserve(_low + first, _high + first + moves.Length - 1);
            var moved = new double[_mass.Length];
            for (int place = _low; place <= _high; place++)
            {
                double mass = _mass[place - _least];
                for (int k = 0; k < moves.Length; k++)
                    moved[place + first + k - _least] += mass * moves[k];
            }

            (_mass, _low, _high) = (moved, _low + first, _high + first + moves.Length - 1);
            Trim();
        }

        /// <summary>Takes out what is at or beyond a limit on either side.</summary>
        public void Drop(int from, int upTo)
        {
            while (_high >= _low && _high >= from)
                _mass[_high-- - _least] = 0;
            while (_high >= _low && _low <= upTo)
                _mass[_low++ - _least] = 0;
        }

        /// <summary>Hands what is at or beyond a limit on one side to another layer.</summary>
        public void MoveTo(Layer other, int from = int.MaxValue, int upTo = int.MinValue)
        {
            for (; _high >= _low && _high >= from; _high--)
                other.Take(_high, ref _mass[_high - _least]);
            for (; _high >= _low && _low <= upTo; _low++)
                other.Take(_low, ref _mass[_low - _least]);
        }

        void Take(int place, ref double mass)
        {
            Reserve(place, place);
            _mass[place - _least] += mass;
            mass = 0;
            (_low, _high) = _high < _low ? (place, place) : (Math.Min(_low, place), Math.Max(_high, place));
        }

        void Trim()
        {
            for (; _high > _low && _mass[_high - _least] < 1e-15; _high--)
                _mass[_high - _least] = 0;
            for (; _high > _low && _mass[_low - _least] < 1e-15; _low++)
                _mass[_low - _least] = 0;
        }

        void Reserve(int low, int high)
        {
            if (low >= _least && high < _least + _mass.Length)
                return;

            int least = Math.Min(low, _least) - 64;
            var wider = new double[Math.Max(high, _least + _mass.Length) + 64 - least];
            _mass.CopyTo(wider, _least - least);
            (_mass, _least) = (wider, least);
        }
    }
}
