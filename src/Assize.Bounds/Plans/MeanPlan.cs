namespace Assize.Bounds;

/// <summary>How many trials a claim about a mean takes, and which averages uphold it, both errors bounded.</summary>
/// <remarks>
/// At each number of trials the least of the bounds that the facts allow decides, for either error by itself; beyond
/// 20,000 trials the least of those in closed form. A
/// two-sided
/// claim gives half its risk to each side; either miss may use all of its allowance. Where only the standard deviation
/// is
/// bounded, the average is no good statistic: Catoni's is.
/// </remarks>
public sealed class MeanPlan
{
    // Beyond so many trials only closed forms decide: a plan is made each time a claim is judged.
    const long MostForCostly = 20_000;

    // Paid to the rounding of the average, in units of the margin.
    const double Rounding = 1e-9;

    readonly IReadOnlyList<MeanSide> _sides;
    readonly IReadOnlyList<MeanTheorem> _known;
    readonly IReadOnlyList<MeanTheorem> _applicable;
    readonly Lazy<IReadOnlyList<TheoremTrials>> _theorems;

    MeanPlan(Edges edges, MeanFacts facts, double risk, double confidence, double miss)
    {
        (Edges, Facts, Risk, Confidence, Miss) = (edges, facts, risk, confidence, miss);
        _sides = MeanSide.Of(edges, facts, risk);
        _known = [.. MeanTheorem.All.Where(theorem => theorem.Applies(facts))];
        MeanTheorem[] quick = [.. _known.Where(theorem => !theorem.IsCostly)];
        _applicable = TrialsBy(quick) > MostForCostly ? quick : _known;
        long? average = TrialsBy(_applicable);
        var catoni = CatoniPlan.Of(_sides, facts, miss);
        if (average is null && catoni is null)
            throw _applicable.Count == 0 && facts.StandardDeviation is null ? NoFacts() : RatePlan.TooManyTrials();

        Influence = average is null || catoni?.Trials < average ? catoni : null;
        Trials = Influence?.Trials ?? average!.Value;
        Theorem = Influence is null ? Deciding(Trials) : CatoniPlan.Name;
        _theorems = new(() => [.. Alone(catoni).OrderBy(theorem => theorem.Trials ?? long.MaxValue)]);
    }

    /// <summary>The plan for a claim.</summary>
    /// <param name="edges">The claim's target, edges and defects.</param>
    /// <param name="facts">What is known about a draw, at least one fact.</param>
    /// <param name="risk">The probability of a false failure allowed, in [1e-300, 1).</param>
    /// <param name="confidence">One minus the probability of a missed defect allowed, in (0, 1) and above the
    /// risk.</param>
    /// <returns>A plan that meets both, at its number of trials and at every larger one.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, nothing is known about a draw, or more
    /// than 1e15 trials would be needed.</exception>
    public static MeanPlan For(Edges edges, MeanFacts facts, double risk, double confidence)
    {
        if (edges is null)
            throw new ArgumentNullException(nameof(edges));
        if (facts is null)
            throw new ArgumentNullException(nameof(facts));
        Demand.RiskAndConfidence(risk, confidence);
        if (facts.Minimum > edges.Domain.Minimum || facts.Maximum < edges.Domain.Maximum)
            throw new ClaimRefusedException("The range of the draws does not cover the means claimed.");

        return new MeanPlan(edges, facts, risk, confidence, Decimals.Complement(confidence));
    }

    /// <summary>The plan of the same claim for a share of both error probabilities.</summary>
    /// <param name="riskShare">The share of the risk that the plan may spend, in (0, 1].</param>
    /// <param name="missShare">The share of the miss that the plan may spend, in (0, 1].</param>
    /// <returns>A plan of those risks.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A share lies outside its domain, or is NaN.</exception>
    /// <exception cref="ClaimRefusedException">More than 1e15 trials would be needed.</exception>
    public MeanPlan Share(double riskShare, double missShare)
    {
        Check.Inside(riskShare, 0, 1.0000000000000002, nameof(riskShare));
        Check.Inside(missShare, 0, 1.0000000000000002, nameof(missShare));
        return new MeanPlan(Edges, Facts, riskShare * Risk, 1 - missShare * Miss, missShare * Miss);
    }

    /// <summary>The claim's target, edges and defects.</summary>
    public Edges Edges { get; }

    /// <summary>What is known about a draw.</summary>
    public MeanFacts Facts { get; }

    /// <summary>The probability of a false failure allowed, in [1e-300, 1).</summary>
    public double Risk { get; }

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1).</summary>
    public double Confidence { get; }

    /// <summary>1 - <see cref="Confidence"/>, taken in decimal: 0.999 gives 0.001.</summary>
    public double Miss { get; }

    /// <summary>The plan: it and every larger number of trials meet risk and confidence.</summary>
    public long Trials { get; }

    /// <summary>The theorem that decided; two where the errors are bounded by different ones.</summary>
    public string Theorem { get; }

    /// <summary>Whether Catoni's statistic decides, the sum of <see cref="InfluenceOf"/> over all draws, instead of the
    /// average.</summary>
    public bool IsByInfluence => Influence is not null;

    /// <summary>Every theorem that applies, with the trials it would need alone, fewest first.</summary>
    public IReadOnlyList<TheoremTrials> Theorems => _theorems.Value;

    CatoniPlan? Influence { get; }

    /// <summary>What a draw adds to Catoni's statistic.</summary>
    /// <param name="deviation">The draw minus the edge on the upper side, the edge minus the draw on the lower
    /// one.</param>
    /// <returns>ψ(s · deviation), ψ(y) = sgn(y) · ln(1 + |y| + y²/2), for this plan's scale s.</returns>
    /// <exception cref="InvalidOperationException">The average is this plan's statistic.</exception>
    public double InfluenceOf(double deviation) => Catoni.Influence(ByInfluence().Scale * deviation);

    /// <summary>From here on Catoni's statistic refutes the claim, on either side.</summary>
    /// <param name="trials">Number of trials, in [1, 1e15].</param>
    /// <returns>The limit; it leaves room for an error of 1e-6 in the sum.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials lies outside its domain.</exception>
    /// <exception cref="InvalidOperationException">The average is this plan's statistic.</exception>
    public double InfluenceLimitAt(long trials)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, RatePlan.MaximumTrials, nameof(trials));
        return ByInfluence().LimitAt(trials);
    }

    CatoniPlan ByInfluence() =>
        Influence ?? throw new InvalidOperationException("The average decides this plan, not Catoni's statistic.");

    /// <summary>The averages that uphold the claim at any number of trials: the fewest that keep the risk.</summary>
    /// <param name="trials">Number of trials, in [1, 1e15].</param>
    /// <returns>The limits, and whether they meet both errors; at <see cref="Trials"/> and beyond they do.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials lies outside its domain.</exception>
    /// <exception cref="InvalidOperationException">The average is not this plan's statistic.</exception>
    public MeanLimits LimitsAt(long trials)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, RatePlan.MaximumTrials, nameof(trials));
        if (Influence is not null)
            throw new InvalidOperationException("Catoni's statistic decides this plan, not the average.");

        double low = double.NegativeInfinity, high = double.PositiveInfinity;
        foreach (var side in _sides)
        {
            double limit = side.Edge + Margin(_applicable, side, trials);
            if (ReferenceEquals(side.Facts, Facts))
                high = limit;
            else
                low = -limit;
        }

        return new MeanLimits(trials, low, high, _sides.All(side => Meets(_applicable, side, trials)));
    }

    // From the edge to the limit; infinite when no limit below the greatest possible average keeps the risk.
    static double Margin(IReadOnlyList<MeanTheorem> theorems, MeanSide side, long trials)
    {
        double greatest = side.Defect - side.Edge ?? (side.Facts.Maximum ?? double.MaxValue / 4) - side.Edge;
        return theorems.Min(theorem => theorem.Margin(side.Facts, trials, side.Edge, side.Risk, greatest)) * (1 + Rounding);
    }

    bool Meets(IReadOnlyList<MeanTheorem> theorems, MeanSide side, long trials)
    {
        if (side.Defect is not { } defect)
            return true;

        double limit = side.Edge + Margin(theorems, side, trials);
        if (!(limit < defect))
            return false;

        var mirrored = side.Facts.Mirrored();
        double margin = (defect - limit) * (1 - Rounding);
        return theorems.Min(theorem => theorem.Beyond(mirrored, trials, -defect, margin)) <= Miss;
    }

    long? TrialsBy(IReadOnlyList<MeanTheorem> theorems)
    {
        if (theorems.Count == 0)
            return null;

        long? most = 1;
        foreach (var side in _sides.Where(side => side.Defect is not null))
            most = Math.Max(most.Value, First(trials => Meets(theorems, side, trials)) ?? long.MaxValue);
        return most <= RatePlan.MaximumTrials ? most : null;
    }

    // Up by fours until it holds, then down by halves: a later trial never undoes an earlier one's success.
    static long? First(Func<long, bool> holds)
    {
        long high = 1;
        while (!holds(high))
        {
            if (high > RatePlan.MaximumTrials / 4)
                return null;
            high *= 4;
        }

        long low = high / 4;
        while (low + 1 < high)
        {
            long middle = low + (high - low) / 2;
            if (holds(middle))
                high = middle;
            else
                low = middle;
        }

        return high;
    }

    string Deciding(long trials)
    {
        var side = _sides.First(side => side.Defect is not null);
        double defect = side.Defect!.Value;
        var (mirrored, limit) = (side.Facts.Mirrored(), side.Edge + Margin(_applicable, side, trials));
        string red = Best(theorem => theorem.Beyond(side.Facts, trials, side.Edge, limit - side.Edge));
        string green = Best(theorem => theorem.Beyond(mirrored, trials, -defect, defect - limit));
        return red == green ? red : $"{red}; {green}";
    }

    string Best(Func<MeanTheorem, double> bound) => _applicable.OrderBy(bound).First().Name;

    // Without "yield", whose state machine asks for the current thread.
    IEnumerable<TheoremTrials> Alone(CatoniPlan? catoni)
    {
        var alone = _known.Select(
            theorem => new TheoremTrials(theorem.Name, TrialsBy([theorem]), theorem.Assumes));
        return catoni is null
            ? alone
            : alone.Append(new TheoremTrials(CatoniPlan.Name, catoni.Trials, CatoniPlan.Assumes));
    }

    static ClaimRefusedException NoFacts() => new(
        "Nothing is known about a draw, so no number of trials says anything about its mean (a rare, huge draw would "
        + "move it). Say between which values draws lie, or how large their standard deviation can be.");
}
