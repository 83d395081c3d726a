using Assize.Bounds;

namespace Assize;

/// <summary>One bet on a mean: that it lies on a side of an anchor, by about a gap.</summary>
/// <param name="Anchor">The edge or the defect that the bet is made against.</param>
/// <param name="Direction">1 when draws above the anchor win, -1 when draws below it do.</param>
/// <param name="Gap">The distance it is sized for, above 0.</param>
/// <param name="Weight">Its share of the wealth at the start.</param>
readonly record struct MeanMember(double Anchor, int Direction, double Gap, double Weight)
{
    /// <summary>The bets against the claim: on each side against its edge, half of the money on the smallest defect, the
    /// rest shared among twice, four times it … up to a reach.</summary>
    public static IReadOnlyList<MeanMember> AgainstClaim(Edges edges, double reach)
    {
        var members = new List<MeanMember>();
        double share = edges is { LowerEdge: not null, UpperEdge: not null } ? 0.5 : 1;
        if (edges.UpperEdge is { } upper)
            members.AddRange(Side(upper, 1, upper - edges.Target, edges.UpperDefect - edges.Target, edges.Domain.Maximum - upper, reach, share));
        if (edges.LowerEdge is { } lower)
            members.AddRange(Side(lower, -1, edges.Target - lower, edges.Target - edges.LowerDefect, lower - edges.Domain.Minimum, reach, share));
        return members;
    }

    /// <summary>The bets against a defect above: half sized for the target, half for the edge.</summary>
    public static IReadOnlyList<MeanMember> AgainstAbove(Edges edges) => edges.UpperDefect is { } defect
        ? AgainstDefect(defect, -1, defect - edges.Target, defect - edges.UpperEdge!.Value)
        : [];

    /// <summary>The bets against a defect below.</summary>
    public static IReadOnlyList<MeanMember> AgainstBelow(Edges edges) => edges.LowerDefect is { } defect
        ? AgainstDefect(defect, 1, edges.Target - defect, edges.LowerEdge!.Value - defect)
        : [];

    static IReadOnlyList<MeanMember> AgainstDefect(double defect, int direction, double wide, double narrow) => wide == narrow
        ? [new(defect, direction, wide, 1)]
        : [new(defect, direction, wide, 0.5), new(defect, direction, narrow, 0.5)];

    static IEnumerable<MeanMember> Side(
        double edge, int direction, double tolerance, double? defect, double room, double reach, double share)
    {
        var gaps = new List<double> { (defect ?? tolerance + room) - tolerance };
        for (double distance = 2 * (defect ?? double.PositiveInfinity); distance < reach; distance *= 2)
            gaps.Add(distance - tolerance);
        return gaps.Select((gap, k) => new MeanMember(
            edge, direction, gap, share * (gaps.Count == 1 ? 1 : k == 0 ? 0.5 : 0.5 / (gaps.Count - 1))));
    }
}
