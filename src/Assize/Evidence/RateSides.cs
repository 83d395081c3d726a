using Assize.Bounds;

namespace Assize;

/// <summary>What counts of many rates say when trials stop: the wealth of every side, and who is farthest off.</summary>
sealed class RateSides(ManyStakes stakes, long[] counts, long trials)
{
    const double LogTwo = 0.693147180559945309417;

    /// <summary>The logarithm of the evidence against one rate, both sides averaged.</summary>
    public double AgainstClaim(int cell)
    {
        var bets = BetsOf(cell);
        return Bet.Average(bets.ClaimFromAbove, bets.ClaimFromBelow, trials, counts[cell]).AtLeast;
    }

    /// <summary>The logarithm of the average over all sides and, for half of the money, over one more bet.</summary>
    public double AgainstClaim(double? together)
    {
        double share = -Elementary.Log(stakes.Plan.Sides) - (together is null ? 0 : LogTwo);
        var logs = new List<double>(2 * counts.Length + 1);
        if (together is { } log)
            logs.Add(log);
        for (int cell = 0; cell < counts.Length; cell++)
        {
            if (BetsOf(cell).ClaimFromAbove?.Wealth(trials, counts[cell]).AtLeast is { } above)
                logs.Add(above + share);
            if (BetsOf(cell).ClaimFromBelow?.Wealth(trials, counts[cell]).AtLeast is { } below)
                logs.Add(below + share);
        }

        return LogSum(logs);
    }

    /// <summary>The logarithm of the average of the evidence against each rate.</summary>
    public double AgainstAverage() =>
        LogSum([.. Enumerable.Range(0, counts.Length).Select(AgainstClaim)]) - Elementary.Log(counts.Length);

    /// <summary>The least evidence that a rate has no defect below; null when there can be none.</summary>
    public double? AgainstDefectBelow() => Least(bets => bets.DefectBelow);

    /// <summary>The least evidence that a rate has no defect above; null when there can be none.</summary>
    public double? AgainstDefectAbove() => Least(bets => bets.DefectAbove);

    public bool IsBeyondTolerance(int cell) => Excess(cell) > 0;

    /// <summary>The rates, those first that are beyond their tolerance by the most standard deviations.</summary>
    public IEnumerable<int> FarthestOff() => Enumerable.Range(0, counts.Length)
        .Select(cell => (Cell: cell, Excess: Excess(cell)))
        .OrderByDescending(cell => cell.Excess)
        .Select(cell => cell.Cell);

    double Excess(int cell)
    {
        var edges = stakes.Plan.Rates[cell];
        double share = (double)counts[cell] / trials;
        double edge = share > edges.Target ? edges.UpperEdge ?? 1 : edges.LowerEdge ?? 0;
        double beyond = share > edges.Target ? share - edge : edge - share;
        return beyond / Math.Sqrt(Math.Max(edge * (1 - edge), 1e-300) / trials);
    }

    double? Least(Func<RateBets, Bet?> bet)
    {
        double? least = null;
        for (int cell = 0; cell < counts.Length; cell++)
        {
            if (bet(BetsOf(cell))?.Wealth(trials, counts[cell]).AtLeast is { } log)
                least = Math.Min(least ?? double.PositiveInfinity, log);
        }

        return least;
    }

    RateBets BetsOf(int cell) => stakes.Bets[stakes.Plan.KindOf[cell]];

    static double LogSum(List<double> logs)
    {
        double greatest = logs.Max();
        return double.IsInfinity(greatest)
            ? greatest
            : greatest + Elementary.Log(logs.Sum(log => Elementary.Exp(log - greatest)));
    }
}
