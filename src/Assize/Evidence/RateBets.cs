using Assize.Bounds;

namespace Assize;

/// <summary>The bets of a race about a rate; a bet on a side that does not exist is null.</summary>
sealed class RateBets
{
    /// <summary>The bets for a claim; the share is what a bet against a defect puts on the target rather than the
    /// edge.</summary>
    public RateBets(Edges edges, double targetShare = 0.5)
    {
        double target = edges.Target;
        if (edges.UpperEdge is { } upper)
            ClaimFromAbove = Bet.AgainstClaim(target, upper, edges.UpperDefect, rim: 1);
        if (edges.LowerEdge is { } lower)
            ClaimFromBelow = Bet.AgainstClaim(target, lower, edges.LowerDefect, rim: 0);
        if (edges.UpperDefect is { } above)
            DefectAbove = Bet.AgainstDefect(target, edges.UpperEdge!.Value, above, targetShare);
        if (edges.LowerDefect is { } below)
            DefectBelow = Bet.AgainstDefect(target, edges.LowerEdge!.Value, below, targetShare);
    }

    /// <summary>Against the claim, gaining by successes.</summary>
    public Bet? ClaimFromAbove { get; }

    /// <summary>Against the claim, gaining by failures.</summary>
    public Bet? ClaimFromBelow { get; }

    /// <summary>Against a defect above, gaining by failures.</summary>
    public Bet? DefectAbove { get; }

    /// <summary>Against a defect below, gaining by successes.</summary>
    public Bet? DefectBelow { get; }
}
