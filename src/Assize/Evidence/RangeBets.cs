using System.Runtime.Intrinsics;

namespace Assize;

/// <summary>Bets on draws in a range: factors 1 + λ·(draw - anchor), λ fixed before the draw.</summary>
/// <remarks>
/// The factor is at least 1 - C > 0 and its mean is 1 + λ·(mean - anchor) ≤ 1 under the hypothesis. The estimate of the
/// variance makes bets good or bad, never unfair, since the draw itself is not in it. Half of each bet may lose half of
/// itself in one draw, half nine tenths: one limit alone is slow for narrow laws, or ruinous for a rare, far draw.
/// I. Waudby-Smith and A. Ramdas, J. R. Stat. Soc. B 86 (2024) 1 (betting on bounded means), from memory.
/// </remarks>
sealed class RangeBets : MeanBets
{
    static readonly double[] Limits = [0.5, 0.9];

    readonly double[] _stakes;
    readonly double[] _anchors;
    readonly double[] _most;
    readonly double _prior;
    Moments _moments;

    RangeBets(IReadOnlyList<MeanMember> members, double[] most, double prior) : base(members)
    {
        _prior = prior;
        _most = most;
        _stakes = new double[Factors.Length];
        _anchors = new double[Factors.Length];
        for (int i = 0; i < members.Count; i++)
            _anchors[i] = members[i].Anchor;
        Size();
    }

    /// <summary>Two bets for each member, one for each limit to what may be lost.</summary>
    /// <param name="members">What is bet on.</param>
    /// <param name="minimum">The least possible draw.</param>
    /// <param name="maximum">The greatest possible draw.</param>
    /// <param name="prior">The variance expected before the first draw.</param>
    public static RangeBets On(IReadOnlyList<MeanMember> members, double minimum, double maximum, double prior)
    {
        MeanMember[] halves = [.. members.SelectMany(member => Limits.Select(_ => member with { Weight = member.Weight / 2 }))];
        var most = halves.Select((member, i) =>
        {
            double room = member.Direction > 0 ? member.Anchor - minimum : maximum - member.Anchor;
            return room > 0 ? Limits[i % 2] / room * (1 - 1e-15) : double.PositiveInfinity;
        });
        return new RangeBets(halves, [.. most], prior);
    }

    public override void Play(double draw)
    {
        var one = Vector256.Create(1.0);
        var greatest = Vector256.Create(1e150);
        var level = Vector256.Create(draw);
        Span<double> factors = Factors;
        ReadOnlySpan<double> stakes = _stakes, anchors = _anchors;
        for (int i = 0; i < factors.Length; i += Vector256<double>.Count)
        {
            var factor = one + Vector256.Create(stakes[i..]) * (level - Vector256.Create(anchors[i..]));
            Vector256.Min(factor, greatest).CopyTo(factors[i..]);
        }

        _moments.Add(draw);
        if (Stretch.EndsAfter(_moments.Trials))
            Size();
    }

    // Kelly's bet for a gap and a variance, g/(variance + g²), within what one draw may take.
    void Size()
    {
        double variance = (_prior + _moments.Squares) / (1 + _moments.Trials);
        for (int i = 0; i < Members.Count; i++)
        {
            var member = Members[i];
            _stakes[i] = member.Direction * Math.Min(member.Gap / (variance + member.Gap * member.Gap), _most[i]);
        }
    }
}
