namespace Assize.Bounds;

/// <summary>How many trials a claim about many rates takes, and which counts uphold each of them, both errors
/// bounded.</summary>
/// <remarks>
/// Red when any count leaves its limits, green when none does. Every side that exists has an even share of the risk
/// (union bound); the miss is not shared, since the one rate that is wrong must pass its own limits. Nothing is assumed
/// about how the rates depend on one another: shares of categories and outputs of one trial do alike.
/// </remarks>
public sealed class ManyRatesPlan
{
    // Exact plans cost milliseconds each; of the others, Chernoff's number is certain and little larger.
    const int MostExactPlans = 24;

    readonly int[] _kindOf;
    readonly List<Edges> _kinds = [];

    ManyRatesPlan(IReadOnlyList<Edges> rates, double risk, double confidence, double miss)
    {
        (Rates, Risk, Confidence, Miss) = (rates, risk, confidence, miss);
        _kindOf = new int[rates.Count];
        var known = new Dictionary<Edges, int>();
        for (int i = 0; i < rates.Count; i++)
        {
            if (!known.TryGetValue(rates[i], out _kindOf[i]))
            {
                known.Add(rates[i], _kindOf[i] = _kinds.Count);
                _kinds.Add(rates[i]);
            }

            Sides += SidesOf(rates[i]);
        }

        Trials = TrialsNeeded();
    }

    /// <summary>The plan for a claim.</summary>
    /// <param name="rates">The edges of each rate, in the domain [0, 1]; at least one.</param>
    /// <param name="risk">The probability of a false failure allowed to all of them together, in [1e-300, 1).</param>
    /// <param name="confidence">One minus the probability of a missed defect allowed, in (0, 1) and above the
    /// risk.</param>
    /// <returns>A plan that meets both at its number of trials and at every larger one.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or more than 1e15 trials would be
    /// needed.</exception>
    public static ManyRatesPlan For(IReadOnlyList<Edges> rates, double risk, double confidence)
    {
        if (rates is null)
            throw new ArgumentNullException(nameof(rates));
        if (rates.Count == 0)
            throw new ClaimRefusedException("A claim about many rates needs at least one.");
        Demand.RiskAndConfidence(risk, confidence);
        return new ManyRatesPlan(rates, risk, confidence, Decimals.Complement(confidence));
    }

    /// <summary>The plan of the same claim for a share of both error probabilities.</summary>
    /// <param name="share">The share of risk and miss that the plan may spend, in (0, 1].</param>
    /// <returns>A plan of risk share · <see cref="Risk"/> and miss share · <see cref="Miss"/>.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The share lies outside its domain, or is NaN.</exception>
    /// <exception cref="ClaimRefusedException">More than 1e15 trials would be needed.</exception>
    public ManyRatesPlan Share(double share)
    {
        Check.Inside(share, 0, 1.0000000000000002, nameof(share));
        return new ManyRatesPlan(Rates, share * Risk, 1 - share * Miss, share * Miss);
    }

    /// <summary>The edges of each rate.</summary>
    public IReadOnlyList<Edges> Rates { get; }

    /// <summary>The different ones among them.</summary>
    public IReadOnlyList<Edges> Kinds => _kinds;

    /// <summary>For each rate, its place among the <see cref="Kinds"/>.</summary>
    public IReadOnlyList<int> KindOf => _kindOf;

    /// <summary>How many sides all rates have together: one for each edge.</summary>
    public long Sides { get; }

    /// <summary>The probability of a false failure allowed, in [1e-300, 1).</summary>
    public double Risk { get; }

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1).</summary>
    public double Confidence { get; }

    /// <summary>1 - <see cref="Confidence"/>, taken in decimal.</summary>
    public double Miss { get; }

    /// <summary>A number of trials such that it and every larger one meet risk and confidence; with more than 24
    /// different rates it may be a little larger than the smallest.</summary>
    public long Trials { get; }

    /// <summary>The theorem that decided.</summary>
    public string Theorem { get; } = BinomialTail.Name;

    /// <summary>The counts that uphold the claim at any number of trials, for each of the <see cref="Kinds"/>: the
    /// fewest that keep the risk.</summary>
    /// <param name="trials">Number of trials, in [1, 1e15].</param>
    /// <returns>For each kind, the least count and the greatest, both in [0, trials].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials lies outside its domain.</exception>
    public IReadOnlyList<(long Low, long High)> LimitsAt(long trials)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, RatePlan.MaximumTrials, nameof(trials));
        return
        [
            .. _kinds.Select(kind => (
                kind.LowerEdge is { } lower ? trials - Side(false, lower, kind.LowerDefect).Limit(trials) : 0,
                kind.UpperEdge is { } upper ? Side(true, upper, kind.UpperDefect).Limit(trials) : trials)),
        ];
    }

    static int SidesOf(Edges edges) => (edges.LowerEdge is null ? 0 : 1) + (edges.UpperEdge is null ? 0 : 1);

    RateSide Side(bool upper, double edge, double? defect) => new(upper, edge, defect, Risk / Sides);

    // What Chernoff's bound proves for a number of trials, it proves for every larger one.
    long TrialsNeeded()
    {
        var proven = _kinds.Select(kind => (Kind: kind, Trials: Proven(kind))).OrderByDescending(kind => kind.Trials).ToList();
        long trials = proven.Count > MostExactPlans ? proven[MostExactPlans].Trials : 1;
        foreach (var (kind, ceiling) in proven.Take(MostExactPlans))
        {
            if (ceiling > trials)
                trials = Math.Max(trials, new RatePlan(kind, Risk * SidesOf(kind) / Sides, Confidence, Miss).Trials);
        }

        return trials;
    }

    long Proven(Edges kind)
    {
        long trials = 1;
        if (kind is { LowerEdge: { } lower, LowerDefect: { } below })
            trials = Math.Max(trials, Proven(Side(false, lower, below)));
        if (kind is { UpperEdge: { } upper, UpperDefect: { } above })
            trials = Math.Max(trials, Proven(Side(true, upper, above)));
        return trials;
    }

    long Proven(RateSide side) => 1 + (ChernoffTrials.Ceiling(side, Miss) ?? throw RatePlan.TooManyTrials());
}
