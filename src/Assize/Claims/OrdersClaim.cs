using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Every order of a few things comes equally often, give or take a tolerance.</summary>
    /// <param name="count">How many things, in [2, 8]; a draw is a list of 0 … count − 1 in some order, a new one each trial.</param>
    /// <param name="tolerance">How far from 1/count! the share of each order is still right: a distance, 0 allowed.</param>
    /// <returns>A claim whose defect is twice the tolerance, unless it is given another.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain.</exception>
    public static OrdersClaim EqualOrders(int count, double tolerance) => new(count, tolerance, null);
}

/// <summary>A claim that every order comes equally often. Draws are compared by content; one that is no order refutes.</summary>
public sealed record OrdersClaim : Claim<IReadOnlyList<int>>
{
    const int Most = 8;

    readonly int _count;
    readonly double _tolerance;
    readonly double? _defect;
    readonly ManyStakesMemory? _stakes;

    internal OrdersClaim(int count, double tolerance, double? defect)
    {
        if (count is < 2 or > Most)
            throw new ClaimRefusedException($"EqualOrders is about 2 to {Most} things; it is {count}. "
                + "For more, claim with EqualShares which thing is first, or which of two comes before the other.");

        (_count, _tolerance, _defect) = (count, tolerance, defect);
        // Without a tolerance the defect is still to come.
        if (tolerance != 0 || defect is not null)
            _stakes = Memory();
    }

    /// <summary>Says how far from its share an order must be caught, where that is not twice the tolerance.</summary>
    /// <param name="defect">A distance above the tolerance.</param>
    /// <returns>The claim with this defect.</returns>
    /// <exception cref="ClaimRefusedException">The number lies outside its domain, or leaves nothing to catch.</exception>
    public OrdersClaim WithDefect(double defect) => new(_count, _tolerance, defect) { Terms = Terms };

    internal override string Sentence => $"each of the {Wording.Number((long)Ranks)} orders of {_count} things has a share of "
        + $"{Wording.Number(1.0 / Ranks)}, {(_tolerance == 0 ? "exactly" : $"give or take {Wording.Number(_tolerance)}")} (caught from {Wording.Number(Caught)} away)";

    internal override Statement Statement => new("orders", "share", null, _tolerance, Caught, null);

    /// <inheritdoc/>
    public override Plan Plan() => Stakes().ToPlan();

    private protected override IRace<IReadOnlyList<int>> Start()
    {
        var stakes = Stakes();
        string Name(int rank) => OrderRank.Text(OrderRank.Unranked(rank, _count));
        IRace<int> race = ExactTrials(() => stakes.Plan.Trials) is { } trials
            ? new FixedShares(stakes, Name, trials)
            : new SharesRace(stakes, Name, Terms.TrialCap);
        return new CategoryRace<IReadOnlyList<int>>(
            race,
            draw => OrderRank.Of(draw, _count),
            draw => $"{(draw is null ? "null" : OrderRank.Text(draw))}, which is no order of 0 to {_count - 1}");
    }

    double Caught => _defect ?? 2 * _tolerance;

    int Ranks => Enumerable.Range(1, _count).Aggregate(1, (product, factor) => product * factor);

    ManyStakes Stakes() => (_stakes ?? Memory()).For(Risk, Confidence);

    ManyStakesMemory Memory() =>
        new([.. Enumerable.Repeat(Edges.Around(Domain.Rate, 1.0 / Ranks, _tolerance, _defect), Ranks)]);
}
