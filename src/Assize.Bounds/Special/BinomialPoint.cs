namespace Assize.Bounds;

/// <summary>One count of a binomial distribution, 0 &lt; rate &lt; 1: its probability and the tails that begin there.</summary>
/// <remarks>
/// Mass: C. Loader, Fast and accurate computation of binomial probabilities (2000), with the deviance fed by the exact difference of mean and count.
/// Tails: mass times a continued fraction, see <see cref="BetaFraction"/>.
/// </remarks>
readonly struct BinomialPoint
{
    readonly double _rate;
    readonly double _other;
    readonly double _successes;
    readonly double _failures;
    readonly double _meanExcess;
    readonly double _exponent;
    readonly double _factor;

    public BinomialPoint(long trials, long successes, double rate)
    {
        double n = trials;
        _rate = rate;
        _other = 1 - rate;
        _successes = successes;
        _failures = trials - successes;

        var mean = Twofold.Product(n, rate);
        _meanExcess = mean.Upper - _successes + mean.Lower;
        if (_successes == 0 || _failures == 0)
        {
            _exponent = n * (_successes == 0 ? Elementary.LogOnePlus(-rate) : LogRate(rate));
            _factor = 1;
            return;
        }

        double deviance = Deviance(_successes, _meanExcess, mean.Upper) + Deviance(_failures, -_meanExcess, n * _other);
        _exponent = StirlingError.Of(n) - StirlingError.Of(_successes) - StirlingError.Of(_failures) - deviance;
        _factor = Math.Sqrt(n / (2 * Math.PI * _successes * _failures));
    }

    public double Mass => Math.Min(1, _factor * Elementary.Exp(_exponent));

    public double LogMass => Math.Min(0, _exponent + Elementary.Log(_factor));

    public double UpperTail => Math.Min(1, UpperFactor * Elementary.Exp(_exponent));

    public double LowerTail => Math.Min(1, LowerFactor * Elementary.Exp(_exponent));

    public double LogUpperTail => Math.Min(0, _exponent + Elementary.Log(UpperFactor));

    public double LogLowerTail => Math.Min(0, _exponent + Elementary.Log(LowerFactor));

    /// <summary>P(S ≥ successes) / P(S = successes), from the mode upwards; it does not underflow.</summary>
    public double UpperTailOverMass => BetaFraction.TailOverMass(_successes, _failures, _rate, _other, _meanExcess);

    /// <summary>P(S ≤ successes) / P(S = successes), from the mode downwards; it does not underflow.</summary>
    public double LowerTailOverMass => BetaFraction.TailOverMass(_failures, _successes, _other, _rate, -_meanExcess);

    double UpperFactor => _factor * UpperTailOverMass;

    double LowerFactor => _factor * LowerTailOverMass;

    // 1 - rate is exact from ½ upwards, so the logarithm of a rate near 1 loses nothing.
    static double LogRate(double rate) => rate < 0.5 ? Elementary.Log(rate) : Elementary.LogOnePlus(-(1 - rate));

    // count · ln(count / mean) + mean - count, without cancellation.
    static double Deviance(double count, double meanExcess, double mean)
    {
        double relative = meanExcess / count;
        return relative > -0.5
            ? count * Elementary.LogShortfall(relative)
            : count * (relative - Elementary.Log(mean / count));
    }
}
