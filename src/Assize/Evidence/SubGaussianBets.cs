using Assize.Bounds;

namespace Assize;

/// <summary>Bets on draws whose tails are no heavier than normal ones: factors exp(λ·(draw - anchor) - λ²·proxy²/2).</summary>
/// <remarks>λ has the sign of the bet, so the mean of the factor is 1 at most on the whole half-line of the hypothesis; a
/// mixture over both signs would not be fair for a mean on the near side of the anchor.</remarks>
sealed class SubGaussianBets : MeanBets
{
    // Of one factor: what a bet could win beyond it is given away.
    const double MostLog = 300;

    readonly double[] _stakes;
    readonly double[] _prices;

    public SubGaussianBets(IReadOnlyList<MeanMember> members, double proxy) : base(members)
    {
        double variance = proxy * proxy;
        _stakes = [.. members.Select(member => member.Direction * member.Gap / variance)];
        _prices = [.. _stakes.Select(stake => stake * stake * variance / 2 * (1 + 1e-15))];
    }

    // The exponent loses up to a few of its own last digits.
    public override double FactorUnits => 2048;

    public override void Play(double draw)
    {
        for (int i = 0; i < _stakes.Length; i++)
        {
            double log = Math.Min(_stakes[i] * (draw - Members[i].Anchor) - _prices[i], MostLog);
            Factors[i] = log > -700 ? Elementary.Exp(log) : 0;
        }
    }
}
