namespace Assize.Bounds;

/// <summary>How many trials a claim about the standard deviation of normal draws takes, and which sums of squares uphold
/// it.</summary>
/// <remarks>
/// The sum of squared deviations from the average is the variance times a chi-square variable, exactly. The test is
/// the most
/// powerful of its level, so it misses less with every trial. A two-sided claim gives half its risk to each side.
/// </remarks>
public sealed class NormalSpreadPlan
{
    /// <summary>The theorem behind every plan of this class.</summary>
    public const string Theorem = "exact chi-square";

    // Above the error of a quantile and of the sum of squares.
    const double Rounding = 1e-10;

    readonly double _share;

    NormalSpreadPlan(Edges edges, double risk, double confidence, double miss)
    {
        (Edges, Risk, Confidence, Miss) = (edges, risk, confidence, miss);
        _share = edges is { LowerEdge: > 0, UpperEdge: not null } ? risk / 2 : risk;
        Trials = Math.Max(
            edges.UpperDefect is null ? 0 : First(degrees => Meets(degrees, upper: true)),
            edges.LowerDefect is not > 0 ? 0 : First(degrees => Meets(degrees, upper: false))) + 1;
    }

    /// <summary>The plan for a claim.</summary>
    /// <param name="edges">Target, edges and defects of the standard deviation, all 0 or more; a defect of 0 is not
    /// caught by trials: it is seen at once.</param>
    /// <param name="risk">The probability of a false failure allowed, in [1e-300, 1).</param>
    /// <param name="confidence">One minus the probability of a missed defect allowed, in (0, 1) and above the
    /// risk.</param>
    /// <returns>A plan that meets both, at its number of trials and at every larger one.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or more than 1e9 trials would be
    /// needed.</exception>
    public static NormalSpreadPlan For(Edges edges, double risk, double confidence)
    {
        if (edges is null)
            throw new ArgumentNullException(nameof(edges));
        Demand.RiskAndConfidence(risk, confidence);
        return edges.Domain.Minimum >= 0
            ? new NormalSpreadPlan(edges, risk, confidence, Decimals.Complement(confidence))
            : throw new ClaimRefusedException("A standard deviation is 0 or more; these edges are of another quantity.");
    }

    /// <summary>The plan of the same claim for a share of both error probabilities.</summary>
    /// <param name="share">The share of risk and miss that the plan may spend, in (0, 1].</param>
    /// <returns>A plan of those risks.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The share lies outside its domain, or is NaN.</exception>
    public NormalSpreadPlan Share(double share)
    {
        Check.Inside(share, 0, 1.0000000000000002, nameof(share));
        return new NormalSpreadPlan(Edges, share * Risk, 1 - share * Miss, share * Miss);
    }

    /// <summary>The claim's target, edges and defects.</summary>
    public Edges Edges { get; }

    /// <summary>The probability of a false failure allowed, in [1e-300, 1).</summary>
    public double Risk { get; }

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1).</summary>
    public double Confidence { get; }

    /// <summary>1 - <see cref="Confidence"/>, taken in decimal.</summary>
    public double Miss { get; }

    /// <summary>The plan: it and every larger number of trials meet risk and confidence.</summary>
    public long Trials { get; }

    /// <summary>The sums of squared deviations that uphold the claim.</summary>
    /// <param name="trials">Number of trials, at least 2.</param>
    /// <returns>The least and the greatest sum; 0 and ∞ where there is no limit.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials lies outside its domain.</exception>
    public (double AcceptLow, double AcceptHigh) LimitsAt(long trials)
    {
        Check.AtLeast(trials, 2, nameof(trials));
        return (
            Edges.LowerEdge is > 0 and { } lower ? Limit(trials - 1, lower, upper: false) : 0,
            Edges.UpperEdge is { } upper ? Limit(trials - 1, upper, upper: true) : double.PositiveInfinity);
    }

    double Limit(long degrees, double edge, bool upper) => upper
        ? ChiSquare.UpperQuantile(degrees, _share) * (1 + Rounding) * edge * edge
        : ChiSquare.LowerQuantile(degrees, _share) * (1 - Rounding) * edge * edge;

    bool Meets(long degrees, bool upper)
    {
        double edge = (upper ? Edges.UpperEdge : Edges.LowerEdge)!.Value;
        double defect = (upper ? Edges.UpperDefect : Edges.LowerDefect)!.Value;
        double level = Limit(degrees, edge, upper) / (defect * defect);
        return upper
            ? ChiSquare.LowerTail(degrees, level * (1 + Rounding)) <= Miss * (1 - 1e-9)
            : ChiSquare.UpperTail(degrees, level * (1 - Rounding)) <= Miss * (1 - 1e-9);
    }

    static long First(Func<long, bool> holds)
    {
        const long most = 1_000_000_000;
        long first = IntegerSearch.First(1, most, 64, holds);
        return first <= most ? first : throw new ClaimRefusedException(
            "This claim would take more than 1e9 trials. Choose a larger defect, a larger risk or a smaller confidence.");
    }
}
