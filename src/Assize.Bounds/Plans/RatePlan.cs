namespace Assize.Bounds;

/// <summary>How many trials a claim about a rate takes, and which counts of successes uphold it, both errors
/// bounded.</summary>
/// <remarks>
/// Exact binomial tails decide. A two-sided claim gives half its risk to each side; either miss may use all of its
/// allowance, since the rate cannot be too low and too high at once. A side without a defect to catch keeps its limit
/// and asks nothing of the miss. For a two-sided claim of a risk above about 0.2 the numbers of trials may be slightly
/// larger than the smallest; they are never smaller.
/// </remarks>
public sealed class RatePlan
{
    /// <summary>No plan is made beyond this many trials: 1e15.</summary>
    public const long MaximumTrials = 1_000_000_000_000_000;

    readonly RateSide? _lower;
    readonly RateSide? _upper;
    readonly List<RateSearch> _searches = [];
    readonly Lazy<long> _firstTrials;
    readonly Lazy<IReadOnlyList<TheoremTrials>> _theorems;

    internal RatePlan(Edges edges, double risk, double confidence, double miss)
    {
        (Edges, Risk, Confidence, Miss) = (edges, risk, confidence, miss);
        double share = edges.LowerEdge is not null && edges.UpperEdge is not null ? risk / 2 : risk;
        if (edges.LowerEdge is { } lowerEdge)
            _lower = new RateSide(upper: false, lowerEdge, edges.LowerDefect, share);
        if (edges.UpperEdge is { } upperEdge)
            _upper = new RateSide(upper: true, upperEdge, edges.UpperDefect, share);
        if (_lower is { Catches: true })
            _searches.Add(new RateSearch(_lower, _upper, Miss));
        if (_upper is { Catches: true })
            _searches.Add(new RateSearch(_upper, _lower, Miss));

        Trials = _searches.Max(search => search.LastFailing()) + 1;
        _firstTrials = new(FirstThatWorks);
        Limits = LimitsAt(Trials);
        _theorems = new(() =>
            [.. RateTheorem.All().Select(TrialsOf).OrderBy(theorem => theorem.Trials ?? long.MaxValue)]);
    }

    /// <summary>The plan for a claim.</summary>
    /// <param name="edges">The claim's target, edges and defects, in the domain [0, 1].</param>
    /// <param name="risk">The probability of a false failure allowed, in [1e-300, 1).</param>
    /// <param name="confidence">One minus the probability of a missed defect allowed, in (0, 1) and above the
    /// risk.</param>
    /// <returns>A plan that meets both, with the fewest trials from which every larger number meets them too.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or more than 1e15 trials would be
    /// needed.</exception>
    public static RatePlan For(Edges edges, double risk, double confidence)
    {
        if (edges is null)
            throw new ArgumentNullException(nameof(edges));
        if (!(edges.Domain.Minimum >= 0 && edges.Domain.Maximum <= 1))
            throw Refused("A rate lies between 0 and 1; these edges are of another quantity. Use Domain.Rate.");
        Demand.RiskAndConfidence(risk, confidence);
        return new RatePlan(edges, risk, confidence, Decimals.Complement(confidence));
    }

    /// <summary>The plan of the same claim for a share of both error probabilities.</summary>
    /// <param name="share">The share of risk and miss that the plan may spend, in (0, 1].</param>
    /// <returns>A plan of risk share · <see cref="Risk"/> and miss share · <see cref="Miss"/>.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The share lies outside its domain, or is NaN.</exception>
    /// <exception cref="ClaimRefusedException">More than 1e15 trials would be needed.</exception>
    public RatePlan Share(double share)
    {
        Check.Inside(share, 0, 1.0000000000000002, nameof(share));
        return new RatePlan(Edges, share * Risk, 1 - share * Miss, share * Miss);
    }

    /// <summary>The claim's target, edges and defects.</summary>
    public Edges Edges { get; }

    /// <summary>The probability of a false failure allowed, in [1e-300, 1).</summary>
    public double Risk { get; }

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1).</summary>
    public double Confidence { get; }

    /// <summary>1 - <see cref="Confidence"/>, taken in decimal: 0.999 gives 0.001.</summary>
    public double Miss { get; }

    /// <summary>The plan: the smallest number of trials such that it and every larger number meet risk and
    /// confidence.</summary>
    public long Trials { get; }

    /// <summary>The smallest number of trials that meets them at all; some larger ones do not.</summary>
    public long FirstTrials => _firstTrials.Value;

    /// <summary>The counts that uphold the claim at <see cref="Trials"/>.</summary>
    public RateLimits Limits { get; }

    /// <summary>The theorem that decided.</summary>
    public string Theorem { get; } = BinomialTail.Name;

    /// <summary>Every theorem that applies, with the trials it would need alone, fewest first.</summary>
    public IReadOnlyList<TheoremTrials> Theorems => _theorems.Value;

    /// <summary>The counts that uphold the claim at any number of trials: the fewest that keep the risk.</summary>
    /// <param name="trials">Number of trials, in [1, 1e15].</param>
    /// <returns>The limits, both error probabilities, and whether they meet what was asked.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials lies outside its domain.</exception>
    public RateLimits LimitsAt(long trials)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, MaximumTrials, nameof(trials));
        long low = _lower is null ? 0 : trials - _lower.Limit(trials);
        long high = _upper is null ? trials : _upper.Limit(trials);
        return new RateLimits(trials, low, high)
        {
            FalseFailure = Greater(_lower, _upper, side => ProportionAssessment.Assess(trials, low, high, side.Edge)),
            MissedDefect = Greater(
                _lower is { Catches: true } ? _lower : null,
                _upper is { Catches: true } ? _upper : null,
                side => BinomialTail.Between(trials, low, high, side.Defect)),
            MeetsBoth = _searches.TrueForAll(search => search.Works(trials)),
        };
    }

    static ClaimRefusedException Refused(string message) => new(message);

    internal static ClaimRefusedException TooManyTrials() => Refused(
        "This claim would take more than 1e15 trials. Choose a larger defect, a larger risk or a smaller confidence.");

    long FirstThatWorks()
    {
        long trials = _searches.Max(search => search.Floor);
        while (trials < Trials)
        {
            long next = _searches.Max(search => search.NextWorking(trials));
            if (next == trials)
                return trials;

            trials = next;
        }

        return Trials;
    }

    TheoremTrials TrialsOf(RateTheorem theorem) => new(
        theorem.Name,
        theorem.TrialsNeeded(this, [.. new[] { _lower, _upper }.OfType<RateSide>().Where(side => side.Catches)]),
        theorem.Assumes);

    static Enclosure Greater(RateSide? lower, RateSide? upper, Func<RateSide, Enclosure> probability)
    {
        if (lower is null || upper is null)
            return probability((lower ?? upper)!);

        var (a, b) = (probability(lower), probability(upper));
        return new Enclosure(Math.Max(a.Lower, b.Lower), Math.Max(a.Upper, b.Upper));
    }
}
