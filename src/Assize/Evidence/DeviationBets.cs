namespace Assize;

/// <summary>Bets on draws whose standard deviation is bounded, however far a single one may lie.</summary>
/// <remarks>
/// With y = λ·(draw - anchor) the factor is f(y)/(1 + λ²σ²/3), f(y) = 1 + y + y²/3 from y = -3/2 on and 1/4 below. f is
/// nondecreasing and f ≤ 1 + y + y²/3; shifted up to the anchor, a draw has E f ≤ 1 + λ²σ²/3. (The unclipped quadratic
/// would not do: it is not monotone, and a mean far below the anchor would win.)
/// </remarks>
sealed class DeviationBets : MeanBets
{
    const double Curvature = 1.0 / 3;

    readonly double[] _stakes;
    readonly double[] _shares;

    public DeviationBets(IReadOnlyList<MeanMember> members, double deviation) : base(members)
    {
        double variance = deviation * deviation;
        _stakes = [.. members.Select(member => member.Direction * member.Gap / (variance + member.Gap * member.Gap))];
        _shares = [.. _stakes.Select(stake => 1 / (1 + Curvature * stake * stake * variance) * (1 - 1e-15))];
    }

    public override void Play(double draw)
    {
        for (int i = 0; i < _stakes.Length; i++)
        {
            double y = _stakes[i] * (draw - Members[i].Anchor);
            double factor = y >= -1.5 ? 1 + y * (1 + Curvature * y) : 0.25;
            Factors[i] = Math.Min(factor * _shares[i], 1e150);
        }
    }
}
