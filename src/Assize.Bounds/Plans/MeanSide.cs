namespace Assize.Bounds;

/// <summary>One side of a claim about a mean, turned so that it looks upwards: too great is wrong.</summary>
/// <param name="Facts">The facts, mirrored for the lower side.</param>
/// <param name="Edge">The greatest mean that is right.</param>
/// <param name="Defect">The least mean that must be caught; null when there is none.</param>
/// <param name="Risk">The probability of red allowed at the edge.</param>
sealed record MeanSide(MeanFacts Facts, double Edge, double? Defect, double Risk)
{
    /// <summary>The sides of a claim, each with its share of the risk; those without an edge are left out.</summary>
    public static IReadOnlyList<MeanSide> Of(Edges edges, MeanFacts facts, double risk)
    {
        double share = edges.LowerEdge is not null && edges.UpperEdge is not null ? risk / 2 : risk;
        var sides = new List<MeanSide>();
        if (edges.UpperEdge is { } upper)
            sides.Add(new MeanSide(facts, upper, edges.UpperDefect, share));
        if (edges.LowerEdge is { } lower)
            sides.Add(new MeanSide(facts.Mirrored(), -lower, -edges.LowerDefect, share));
        return sides;
    }
}
