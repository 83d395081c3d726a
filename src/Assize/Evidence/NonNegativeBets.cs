using Assize.Bounds;

namespace Assize;

/// <summary>Bets on draws that are never negative and whose mean square is bounded.</summary>
/// <remarks>
/// Downwards the factor is exp(-λ(draw - anchor) - λ²m/2): from e^-u ≤ 1 - u + u²/2 for u ≥ 0, its mean is e^(-λ(mean -
/// anchor)) at most. Upwards a far draw must not decide, so those are the bets on a bounded deviation, m being more than
/// the variance.
/// </remarks>
sealed class NonNegativeBets : MeanBets
{
    readonly DeviationBets _upwards;
    readonly double[] _stakes;
    readonly double[] _prices;

    public NonNegativeBets(IReadOnlyList<MeanMember> members, double secondMoment) : base(members)
    {
        _upwards = new DeviationBets(members, Math.Sqrt(secondMoment));
        _stakes = [.. members.Select(member => member.Gap / secondMoment)];
        _prices = [.. _stakes.Select(stake => stake * stake * secondMoment / 2 * (1 + 1e-15))];
    }

    // The exponent loses up to a few of its own last digits; λ times the anchor bounds what it can win.
    public override double FactorUnits => 2048;

    public override void Play(double draw)
    {
        _upwards.Play(draw);
        for (int i = 0; i < _stakes.Length; i++)
        {
            var member = Members[i];
            double log = -_stakes[i] * (draw - member.Anchor) - _prices[i];
            Factors[i] = member.Direction > 0 ? _upwards.Factors[i] : log > -700 ? Elementary.Exp(Math.Min(log, 300)) : 0;
        }
    }
}
