using Assize.Bounds;

namespace Assize;

/// <summary>The numbers of a claim about a standard deviation.</summary>
/// <param name="Edges">Target, edges and defects of the standard deviation.</param>
/// <param name="Tolerance">How far from the target is still right.</param>
/// <param name="Defect">How far from the target is caught.</param>
sealed record SpreadNumbers(Edges Edges, double Tolerance, double Defect)
{
    /// <summary>No standard deviation is negative.</summary>
    public static Domain Domain { get; } = new(0, double.PositiveInfinity);

    /// <summary>The same claim about the variance of draws in a range: every number squared, so the sides are no longer
    /// alike.</summary>
    public Edges OfVariance(double range)
    {
        double greatest = range * range / 2;
        static double? Square(double? value) => value * value;
        double? defect = Square(Edges.UpperDefect) is { } above && above <= range * range / 4 ? above : null;
        return Edges.Between(
            new Domain(0, greatest), Edges.Target * Edges.Target,
            Square(Edges.LowerDefect), Square(Edges.LowerEdge),
            Square(Edges.UpperEdge) is { } upper && upper < greatest ? upper : null, defect);
    }
}
