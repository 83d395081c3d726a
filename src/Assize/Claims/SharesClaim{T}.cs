using System.Collections.Immutable;
using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>Each category has its share of the draws, give or take a tolerance; no other category ever comes.</summary>
    /// <typeparam name="T">What a draw is: an enum, a string, a tuple, anything that can be compared for equality.</typeparam>
    /// <param name="tolerance">How far from its share each category is still right: a distance, 0 allowed.</param>
    /// <param name="shares">The categories and their shares, which sum to 1.</param>
    /// <returns>A claim whose defect is twice the tolerance, unless it is given another.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, the shares do not sum to 1, or a category is there twice.</exception>
    public static SharesClaim<T> Shares<T>(double tolerance, params ReadOnlySpan<(T Category, double Share)> shares)
        where T : notnull => new([.. shares], tolerance);

    /// <summary>The same, from a dictionary; its comparer is kept.</summary>
    /// <typeparam name="T">What a draw is: an enum, a string, a tuple, anything that can be compared for equality.</typeparam>
    /// <param name="tolerance">How far from its share each category is still right: a distance, 0 allowed.</param>
    /// <param name="shares">The categories and their shares, which sum to 1.</param>
    /// <returns>A claim whose defect is twice the tolerance, unless it is given another.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or the shares do not sum to 1.</exception>
    public static SharesClaim<T> Shares<T>(double tolerance, IReadOnlyDictionary<T, double> shares) where T : notnull
    {
        ArgumentNullException.ThrowIfNull(shares);
        return new([.. shares.Select(pair => (pair.Key, pair.Value))], tolerance, (shares as Dictionary<T, double>)?.Comparer);
    }

    /// <summary>Every category has the same share of the draws, give or take a tolerance; no other category ever comes.</summary>
    /// <typeparam name="T">What a draw is: an enum, a string, a tuple, anything that can be compared for equality.</typeparam>
    /// <param name="tolerance">How far from its share each category is still right: a distance, 0 allowed.</param>
    /// <param name="categories">The categories, each once.</param>
    /// <returns>A claim whose defect is twice the tolerance, unless it is given another.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, there is no category, or one is there twice.</exception>
    public static SharesClaim<T> EqualShares<T>(double tolerance, params ReadOnlySpan<T> categories) where T : notnull
    {
        double share = 1.0 / categories.Length;
        var shares = ImmutableArray.CreateBuilder<(T, double)>(categories.Length);
        foreach (var category in categories)
            shares.Add((category, share));
        return new(shares.MoveToImmutable(), tolerance);
    }

    /// <summary>Every value of an enum has the same share of the draws, give or take a tolerance.</summary>
    /// <typeparam name="T">The enum.</typeparam>
    /// <param name="tolerance">How far from its share each value is still right: a distance, 0 allowed.</param>
    /// <returns>A claim whose defect is twice the tolerance, unless it is given another.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or the enum has no value.</exception>
    public static SharesClaim<T> EqualShares<T>(double tolerance) where T : struct, Enum =>
        EqualShares(tolerance, [.. Enum.GetValues<T>().Distinct()]);
}

/// <summary>A claim about how often each category comes.</summary>
/// <typeparam name="T">What a draw is.</typeparam>
public sealed record SharesClaim<T> : Claim<T> where T : notnull
{
    // Thousands of thirds and sevenths still sum to 1 within this; a forgotten category does not.
    const double Rounding = 1e-9;
    const int MostNamed = 8;

    readonly ImmutableArray<(T Category, double Share)> _shares;
    readonly double _tolerance;
    readonly double? _defect;
    readonly IEqualityComparer<T> _comparer;
    readonly ImmutableArray<(T Category, double Tolerance, double? Defect)> _exceptions;
    readonly ManyStakesMemory? _stakes;

    internal SharesClaim(ImmutableArray<(T Category, double Share)> shares, double tolerance, IEqualityComparer<T>? comparer = null)
        : this(shares, tolerance, null, comparer ?? EqualityComparer<T>.Default, [])
    {
    }

    SharesClaim(
        ImmutableArray<(T Category, double Share)> shares, double tolerance, double? defect, IEqualityComparer<T> comparer,
        ImmutableArray<(T Category, double Tolerance, double? Defect)> exceptions)
    {
        (_shares, _tolerance, _defect, _comparer, _exceptions) = (shares, tolerance, defect, comparer, exceptions);
        var numbers = Numbers();
        RequireSum();
        foreach (var (category, _, _) in exceptions)
        {
            if (!numbers.ContainsKey(category))
                throw new ClaimRefusedException($"ToleranceOf names {CategoryText.Of(category)}, which is none of the categories: "
                    + $"{string.Join(", ", shares.Take(MostNamed).Select(share => CategoryText.Of(share.Category)))}"
                    + $"{(shares.Length > MostNamed ? ", …" : "")}.");
        }

        // Without a tolerance the defect is still to come.
        if (tolerance != 0 || defect is not null)
            _stakes = new(EdgesOfAll(numbers));
    }

    /// <summary>Compares categories in another way, say without regard to case.</summary>
    /// <param name="comparer">Says which categories are the same.</param>
    /// <returns>The claim with this comparer.</returns>
    /// <exception cref="ClaimRefusedException">It takes two of the categories for the same.</exception>
    public SharesClaim<T> ComparedBy(IEqualityComparer<T> comparer)
    {
        ArgumentNullException.ThrowIfNull(comparer);
        return new(_shares, _tolerance, _defect, comparer, _exceptions) { Terms = Terms };
    }

    /// <summary>Gives one category a tolerance of its own.</summary>
    /// <param name="category">One of the categories.</param>
    /// <param name="tolerance">How far from its share it is still right: a distance, 0 allowed.</param>
    /// <param name="defect">How far from its share it must be caught: a distance above the tolerance; null for twice the tolerance.</param>
    /// <returns>The claim with this tolerance.</returns>
    /// <exception cref="ClaimRefusedException">There is no such category, or a number lies outside its domain.</exception>
    public SharesClaim<T> ToleranceOf(T category, double tolerance, double? defect = null) =>
        new(_shares, _tolerance, _defect, _comparer, _exceptions.Add((category, tolerance, defect))) { Terms = Terms };

    /// <summary>Says how far from its share a category must be caught, where that is not twice the tolerance.</summary>
    /// <param name="defect">A distance above the tolerance, for every category without one of its own.</param>
    /// <returns>The claim with this defect.</returns>
    /// <exception cref="ClaimRefusedException">The number lies outside its domain, or leaves nothing to catch.</exception>
    public SharesClaim<T> WithDefect(double defect) =>
        new(_shares, _tolerance, defect, _comparer, _exceptions) { Terms = Terms };

    internal override string Sentence => CategoryText.Claimed(
        [.. _shares.Take(MostNamed).Select(share => (CategoryText.Of(share.Category), share.Share))],
        _shares.Length, AreEqual ? _shares[0].Share : null, _tolerance, Caught)
        + string.Concat(_exceptions.Select(own => $"; {CategoryText.Of(own.Category)} within {Wording.Number(own.Tolerance)} "
            + $"(caught from {Wording.Number(own.Defect ?? 2 * own.Tolerance)} away)"));

    internal override Statement Statement => new("shares", "share", null, _tolerance, Caught, null);

    /// <inheritdoc/>
    public override Plan Plan() => Stakes().ToPlan();

    private protected override IRace<T> Start()
    {
        var stakes = Stakes();
        string Name(int cell) => CategoryText.Of(_shares[cell].Category);
        IRace<int> race = ExactTrials(() => stakes.Plan.Trials) is { } trials
            ? new FixedShares(stakes, Name, trials)
            : new SharesRace(stakes, Name, Terms.TrialCap);
        var numbers = Numbers();
        return new CategoryRace<T>(
            race,
            draw => draw is not null && numbers.TryGetValue(draw, out int cell) ? cell : -1,
            draw => $"{CategoryText.Of(draw)}, which is none of the {Wording.Number((long)_shares.Length)} categories");
    }

    double Caught => _defect ?? 2 * _tolerance;

    bool AreEqual => _shares.All(share => share.Share == _shares[0].Share);

    ManyStakes Stakes() => (_stakes ?? new(EdgesOfAll(Numbers()))).For(Risk, Confidence);

    Dictionary<T, int> Numbers()
    {
        if (_shares.Length == 0)
            throw new ClaimRefusedException("Shares need categories; none is given.");

        var numbers = new Dictionary<T, int>(_comparer);
        for (int cell = 0; cell < _shares.Length; cell++)
        {
            if (_shares[cell].Category is null)
                throw new ClaimRefusedException("A category is null; give it a name.");
            if (!numbers.TryAdd(_shares[cell].Category, cell))
                throw new ClaimRefusedException($"The category {CategoryText.Of(_shares[cell].Category)} is there twice "
                    + "for the comparer of this claim: add its shares up.");
        }

        return numbers;
    }

    void RequireSum()
    {
        foreach (var (category, share) in _shares)
        {
            if (!(share is >= 0 and <= 1))
                throw new ClaimRefusedException($"The share of {CategoryText.Of(category)} must lie between 0 and 1; it is {Wording.Exact(share)}.");
        }

        double sum = _shares.Sum(share => share.Share);
        if (!(Math.Abs(sum - 1) <= Rounding))
            throw new ClaimRefusedException($"Shares must sum to 1; these sum to {Wording.Number(sum)}. "
                + "Divide each by their sum, or add the category that is missing.");
    }

    ImmutableArray<Edges> EdgesOfAll(Dictionary<T, int> numbers)
    {
        var own = new Dictionary<int, (double Tolerance, double? Defect)>();
        foreach (var (category, tolerance, defect) in _exceptions)
            own[numbers[category]] = (tolerance, defect);
        var known = new Dictionary<(double, double, double?), Edges>();
        var edges = ImmutableArray.CreateBuilder<Edges>(_shares.Length);
        for (int cell = 0; cell < _shares.Length; cell++)
        {
            var (tolerance, defect) = own.TryGetValue(cell, out var mine) ? mine : (_tolerance, _defect);
            var key = (_shares[cell].Share, tolerance, defect);
            if (!known.TryGetValue(key, out var found))
                known.Add(key, found = EdgesOf(_shares[cell].Category, key.Share, tolerance, defect));
            edges.Add(found);
        }

        return edges.MoveToImmutable();
    }

    static Edges EdgesOf(T category, double share, double tolerance, double? defect)
    {
        try
        {
            return Edges.Around(Domain.Rate, share, tolerance, defect);
        }
        catch (ClaimRefusedException refused)
        {
            throw new ClaimRefusedException($"The share of {CategoryText.Of(category)}: {refused.Message}");
        }
    }
}
