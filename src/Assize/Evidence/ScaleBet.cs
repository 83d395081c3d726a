using Assize.Bounds;

namespace Assize;

/// <summary>A weighted average of likelihood ratios between variances of normal draws.</summary>
/// <remarks>
/// A squared deviation y of variance v has the ratio (p/q)^½·exp(y/2·(1/p - 1/q)) of q to p. For q above p it grows with
/// y, and y grows with v: so its mean is 1 at most for every v up to p, and likewise for q below p from p up.
/// </remarks>
sealed class ScaleBet
{
    // Above the rounding of the sum of squares and of the products, in units of their size.
    const double Rounding = 1e-10;

    readonly double[] _weights;
    readonly double[] _perTrial;
    readonly double[] _perSquare;

    /// <summary>Bets on deviations against one, in equal shares after the first, which has half.</summary>
    public ScaleBet(IReadOnlyList<double> deviations, double against)
    {
        _weights = [.. deviations.Select((_, k) => Elementary.Log(deviations.Count == 1 ? 1 : k == 0 ? 0.5 : 0.5 / (deviations.Count - 1)))];
        _perTrial = [.. deviations.Select(deviation => Elementary.Log(against / deviation))];
        _perSquare = [.. deviations.Select(deviation => (1 / (against * against) - 1 / (deviation * deviation)) / 2)];
    }

    /// <summary>Logarithm of the wealth, surely at least this, after so many squares of so great a sum.</summary>
    public double LogAtLeast(long squares, double sum)
    {
        Span<double> logs = stackalloc double[_weights.Length];
        double greatest = double.NegativeInfinity, size = 0;
        for (int k = 0; k < logs.Length; k++)
        {
            double trials = squares * _perTrial[k], draws = sum * _perSquare[k];
            logs[k] = _weights[k] + trials + draws;
            greatest = Math.Max(greatest, logs[k]);
            size = Math.Max(size, Math.Abs(trials) + Math.Abs(draws));
        }

        double total = 0;
        foreach (double log in logs)
            total += Elementary.Exp(log - greatest);
        return greatest + Elementary.Log(total) - Rounding * (1 + size);
    }
}
