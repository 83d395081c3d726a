namespace Assize;

/// <summary>Bets on a mean: what each wins or loses by one draw, whatever the facts that make them fair.</summary>
abstract class MeanBets
{
    private protected MeanBets(IReadOnlyList<MeanMember> members) =>
        (Members, Factors) = (members, new double[Pot.Padded(members.Count)]);

    public IReadOnlyList<MeanMember> Members { get; }

    /// <summary>The factors of the last draw, one a bet, padded.</summary>
    public double[] Factors { get; }

    /// <summary>What rounding may do to a factor, in units of 2^-53.</summary>
    public virtual double FactorUnits => 64;

    /// <summary>Sets the factors for a draw, from what was known before it; then the draw is known too.</summary>
    public abstract void Play(double draw);
}
