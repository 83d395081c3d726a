namespace Assize.Bounds;

/// <summary>One side of a rate claim, counted away from the target: successes on the upper side, failures on the
/// lower one.</summary>
sealed class RateSide
{
    // Above the largest relative error of a tail (5e-13): what is accepted is within its probability in truth.
    const double Rounding = 1e-12;

    readonly bool _upper;
    readonly double _edge;
    readonly double _defect;
    readonly double _quantile;

    public RateSide(bool upper, double edge, double? defect, double risk)
    {
        _upper = upper;
        _edge = edge;
        _defect = defect ?? double.NaN;
        Risk = risk;
        Catches = defect is not null;
        _quantile = NormalTail.UpperQuantile(risk);
    }

    public bool Catches { get; }

    public double Risk { get; }

    /// <summary>The rate, at the edge, of what this side counts.</summary>
    public double CountedRate => _upper ? _edge : 1 - _edge;

    /// <summary>Whether the limit stays while trials are added, more often than its distance from the trials
    /// does.</summary>
    public bool LimitStays => CountedRate < 0.5;

    public double Edge => _edge;

    public double Defect => _defect;

    public static bool Within(double probability, double allowed) => probability * (1 + Rounding) <= allowed;

    /// <summary>P(count > limit) at the edge.</summary>
    public double Beyond(long trials, long limit) => TailBeyond(trials, limit, _edge);

    /// <summary>P(count > limit) at any rate of success.</summary>
    public double TailBeyond(long trials, long limit, double rate) => _upper
        ? Binomial.UpperTail(trials, limit + 1, rate)
        : Binomial.LowerTail(trials, trials - limit - 1, rate);

    /// <summary>P(count ≤ limit) at the defect.</summary>
    public double Missed(long trials, long limit) => _upper
        ? Binomial.LowerTail(trials, limit, _defect)
        : Binomial.UpperTail(trials, trials - limit, _defect);

    /// <summary>The smallest limit whose excess has no more than the given probability at the edge.</summary>
    public long Limit(long trials, double risk)
    {
        double mean = trials * CountedRate;
        double quantile = risk == Risk ? _quantile : NormalTail.UpperQuantile(risk);
        double skew = (quantile * quantile - 1) * (1 - 2 * CountedRate) / 6;
        double guess = mean + quantile * Math.Sqrt(mean * (1 - CountedRate)) + skew;
        return Limit(trials, risk, (long)Math.Max(0, Math.Min(trials, guess)));
    }

    public long Limit(long trials) => Limit(trials, Risk);

    long Limit(long trials, double risk, long guess) =>
        IntegerSearch.First(0, trials, guess, limit => Within(Beyond(trials, limit), risk));

    /// <summary>
    /// The miss of the most powerful test of exactly this level, randomised at its limit. It falls, or stays, as
    /// trials are
    /// added (Neyman–Pearson; more trials contain fewer), though the miss of the plain test goes up and down like a
    /// saw.
    /// </summary>
    public double SmoothedMiss(long trials, double level)
    {
        long limit = Limit(trials, level);
        return Missed(trials, limit) - Share(trials, limit, level) * Mass(trials, limit, _defect);
    }

    /// <summary>
    /// How often that randomised test is red at a rate on the far side of its edge, where it is the least powerful of
    /// its level:
    /// it falls, or stays, as trials are added.
    /// </summary>
    public double SmoothedRed(long trials, double level, double rate)
    {
        long limit = Limit(trials, level);
        return TailBeyond(trials, limit, rate) + Share(trials, limit, level) * Mass(trials, limit, rate);
    }

    // How much of the limit itself must be red for the level to be met exactly.
    double Share(long trials, long limit, double level) =>
        Math.Max(0, Math.Min(1, (level - Beyond(trials, limit)) / Mass(trials, limit, _edge)));

    /// <summary>P(count = limit) / P(count ≥ limit) at the edge: grows with the limit, falls as trials are
    /// added.</summary>
    public double Hazard(long trials, long limit)
    {
        if (limit > trials || _edge is 0 or 1)
            return 1;
        if (limit < (trials + 1) * CountedRate)
            return Mass(trials, limit, _edge) / Beyond(trials, limit - 1);

        return _upper
            ? 1 / new BinomialPoint(trials, limit, _edge).UpperTailOverMass
            : 1 / new BinomialPoint(trials, trials - limit, _edge).LowerTailOverMass;
    }

    /// <summary>The greatest hazard of the limits of this side's risk between two numbers of trials.</summary>
    public double MostHazard(long first, long last) => LimitStays
        ? Hazard(first, Limit(last))
        : Hazard(last, last - first + Limit(first));

    double Mass(long trials, long limit, double rate) =>
        Binomial.Mass(trials, _upper ? limit : trials - limit, rate);
}
