namespace Assize.Bounds;

/// <summary>The plan for a mean of draws of which only the standard deviation is bounded, for defective code
/// too.</summary>
/// <remarks>
/// T = Σψ(s(x - edge)), s = gap/(2σ² + gap²), red when T ≥ n s²σ²/2 + ln(1/risk). From -ln(1 - y + y²/2) ≤ ψ(y) ≤
/// ln(1 + y + y²/2): E e^T ≤ e^(n s²σ²/2) at the edge, E e^-T ≤ (1 - s·gap + s²(σ² + gap²)/2)^n at the defect; both
/// hold beyond, ψ being nondecreasing.
/// </remarks>
sealed record CatoniPlan(long Trials, double Scale, double Risk, double Deviation)
{
    public const string Name = "Catoni";

    public const string Assumes = "independent draws of bounded standard deviation";

    // Above the rounding of the closed form.
    const double Rounding = 1e-12;

    // Paid to the rounding of the sum, on either side.
    const double Slack = 1e-6;

    public static CatoniPlan? Of(IReadOnlyList<MeanSide> sides, MeanFacts facts, double miss)
    {
        if (facts.StandardDeviation is not { } deviation)
            return null;

        double gap = sides.Where(side => side.Defect is not null).Min(side => side.Defect!.Value - side.Edge);
        double risk = sides[0].Risk;
        double ratio = deviation / gap;
        double trials = 2 * (2 * ratio * ratio + 1) * (2 * Slack - Elementary.Log(risk) - Elementary.Log(miss)) * (1 + Rounding);
        return trials <= RatePlan.MaximumTrials
            ? new CatoniPlan((long)Math.Ceiling(trials), 1 / (2 * deviation * ratio + gap), risk, deviation)
            : null;
    }

    /// <summary>From this value of the statistic on a number of trials refutes; the same on either side.</summary>
    public double LimitAt(long trials) =>
        (trials * (Scale * Deviation) * (Scale * Deviation) / 2 - Elementary.Log(Risk) + Slack) * (1 + Rounding);
}
