using Assize.Bounds;

namespace Assize;

/// <summary>The numbers of a claim about the distance between two distributions.</summary>
sealed record DistanceNumbers
{
    public DistanceNumbers(double tolerance, double? defect)
    {
        Edges = Edges.Around(Domain.Rate, 0, tolerance, defect);
        (Tolerance, Defect) = (tolerance, defect ?? 2 * tolerance);
    }

    public Edges Edges { get; }

    public double Tolerance { get; }

    public double Defect { get; }

    public string Sentence => (Tolerance == 0 ? "exactly" : $"give or take {Wording.Number(Tolerance)} of the draws up to any point")
        + $" (caught from {Wording.Number(Defect)} away)";

    public static Plan PlanOf(DistributionPlan plan) => new(() => null, () => [])
    {
        FixedTrials = plan.FixedTrials,
        FirstTrials = plan.FixedTrials,
        TrialCap = plan.Looks[^1],
        Theorem = plan.Theorem,
    };
}
