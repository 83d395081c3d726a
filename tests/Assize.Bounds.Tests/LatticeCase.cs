namespace Assize.Bounds.Tests;

/// <summary>A total above the mean of some draws on 0 … Top with whole weights, and the facts a bound may use, each
/// rounded so that they stay true.</summary>
sealed record LatticeCase(ExactSum Sum, int[] Weights, int Trials, int Total)
{
    const double Up = 1 + 1e-15;
    const double Down = 1 - 1e-15;

    public int Top => Weights.Length - 1;

    long All => Weights.Sum();

    long Moment => Weights.Select((weight, point) => (long)weight * point).Sum();

    public double Mean => Moment / (double)All;

    long Squares => Weights.Select((weight, point) => (long)weight * point * point).Sum();

    public double Variance => (All * Squares - Moment * Moment) / (double)(All * All) * Up;

    public double Bound => (All * Top - Moment) / (double)All * Up;

    /// <summary>E(X - EX)⁴ / σ⁴.</summary>
    public double Kurtosis =>
        Weights.Select((weight, point) => weight * Math.Pow(point * All - Moment, 4)).Sum() / All
        / Math.Pow(All, 4) / (Variance * Variance) * (1 + 1e-14);

    public double Margin => (Total * All - Trials * Moment) / (double)(Trials * All) * Down;

    public double Probability => Sum.AtLeast(Total);

    public void AssertCovered(double bound) =>
        Assert.True(Sum.CompareAtLeast(Total, bound) <= 0, $"{this}: {bound:R} is below {Probability:R}");

    /// <summary>The same, for totals as far below the mean too.</summary>
    public void AssertBothSidesCovered(double bound)
    {
        int low = (int)Math.Floor((2 * Trials * Moment - Total * All) / (double)All);
        Assert.True(Sum.CompareOutside(low, Total, bound) <= 0, $"{this}: {bound:R} is below both tails");
    }

    public override string ToString() => $"weights {string.Join(' ', Weights)}, {Trials} trials, total {Total}";

    public static IEnumerable<LatticeCase> Every()
    {
        foreach (int[] weights in Laws())
        {
            foreach (int trials in new[] { 1, 2, 3, 5, 8, 13 })
            {
                var sum = new ExactSum(weights, trials);
                for (int total = 1; total <= sum.Greatest; total++)
                {
                    var item = new LatticeCase(sum, weights, trials, total);
                    if (item.Margin > 0)
                        yield return item;
                }
            }
        }
    }

    // Two values with every rate; then up to five, by chance and often lopsided.
    static IEnumerable<int[]> Laws()
    {
        foreach (int hundredths in new[] { 1, 2, 5, 10, 20, 30, 40, 50, 60, 75, 90, 99 })
            yield return [100 - hundredths, hundredths];

        var random = new Random(41);
        for (int i = 0; i < 220; i++)
        {
            int[] weights = [.. Enumerable.Range(0, 3 + i % 3).Select(_ => (int)Math.Pow(2, random.Next(-1, 11)))];
            weights[0]++;
            weights[^1]++;
            yield return weights;
        }
    }
}
