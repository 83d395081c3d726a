namespace Assize.Bounds;

/// <summary>One count of a binomial distribution, 0 &lt; rate &lt; 1: its probability and the tails that begin
/// there.</summary>
/// <remarks>
/// Mass: C. Loader, Fast and accurate computation of binomial probabilities (2000), with the deviance fed by the
/// exact difference of mean and count.
/// Tails: mass times a series near the centre (<see cref="CentralSeries"/>) or a continued fraction
/// (<see cref="BetaFraction"/>).
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
        _meanExcess = MeanExcess(n, _successes, rate);
        double deviance = Deviance(n, _successes, rate);
        bool atEnd = _successes == 0 || _failures == 0;
        _exponent = atEnd ? -deviance : Corrections(n, _successes, _failures) - deviance;
        _factor = atEnd ? 1 : Math.Sqrt(n / (2 * Math.PI * _successes * _failures));
    }

    /// <summary>trials · rate - successes, as exact as a double can be.</summary>
    public static double MeanExcess(double trials, double successes, double rate)
    {
        var mean = Twofold.Product(trials, rate);
        return mean.Upper - successes + mean.Lower;
    }

    /// <summary>trials · KL(successes / trials ‖ rate), without cancellation: Chernoff's exponent.</summary>
    public static double Deviance(double trials, double successes, double rate)
    {
        if (successes == 0)
            return -trials * Elementary.LogOnePlus(-rate);
        if (successes == trials)
            return -trials * LogRate(rate);

        double excess = MeanExcess(trials, successes, rate);
        return CountDeviance.Of(successes, excess, trials * rate)
            + CountDeviance.Of(trials - successes, -excess, trials * (1 - rate));
    }

    public double Mass => Math.Min(1, _factor * Elementary.Exp(_exponent));

    public double LogMass => Math.Min(0, _exponent + Elementary.Log(_factor));

    public double UpperTail => Math.Min(1, UpperFactor * Elementary.Exp(_exponent));

    public double LowerTail => Math.Min(1, LowerFactor * Elementary.Exp(_exponent));

    public double LogUpperTail => Math.Min(0, _exponent + Elementary.Log(UpperFactor));

    public double LogLowerTail => Math.Min(0, _exponent + Elementary.Log(LowerFactor));

    /// <summary>P(S ≥ successes) / P(S = successes), from the mode upwards; it does not underflow.</summary>
    public double UpperTailOverMass => TailOverMass(_successes, _failures, _rate, _other, _meanExcess);

    /// <summary>P(S ≤ successes) / P(S = successes), from the mode downwards; it does not underflow.</summary>
    public double LowerTailOverMass => TailOverMass(_failures, _successes, _other, _rate, -_meanExcess);

    double UpperFactor => _factor * UpperTailOverMass;

    double LowerFactor => _factor * LowerTailOverMass;

    // 1 - rate is exact from ½ upwards, so the logarithm of a rate near 1 loses nothing.
    static double LogRate(double rate) => rate < 0.5 ? Elementary.Log(rate) : Elementary.LogOnePlus(-(1 - rate));

    static double TailOverMass(double successes, double failures, double rate, double other, double meanExcess) =>
        CentralSeries.TailOverMass(successes, failures, rate, other, meanExcess)
        ?? BetaFraction.TailOverMass(successes, failures, rate, other, meanExcess);

    static double Corrections(double trials, double successes, double failures) =>
        StirlingError.Of(trials) - StirlingError.Of(successes) - StirlingError.Of(failures);
}
