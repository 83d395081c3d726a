namespace Assize.Bounds;

/// <summary>How a binomial count is distributed from a limit on: its mass there and the sums of its excess over the
/// limit.</summary>
/// <remarks>Sums of positive terms only; beyond the mode they fall like a geometric series.</remarks>
readonly struct BinomialMoments
{
    BinomialMoments(double mass, double sum0, double sum1, double sum2) =>
        (Mass, Sum0, Sum1, Sum2) = (mass, sum0, sum1, sum2);

    /// <summary>ln P(B = limit).</summary>
    public double Mass { get; }

    /// <summary>Σ P(B = limit + i) / P(B = limit).</summary>
    public double Sum0 { get; }

    /// <summary>Σ i · P(B = limit + i) / P(B = limit).</summary>
    public double Sum1 { get; }

    /// <summary>Σ i² · P(B = limit + i) / P(B = limit).</summary>
    public double Sum2 { get; }

    public static BinomialMoments From(long trials, long limit, double rate)
    {
        double odds = rate / (1 - rate);
        double term = 1, sum0 = 1, sum1 = 0, sum2 = 0;
        for (long k = limit; k < trials; k++)
        {
            double i = k - limit + 1;
            term *= (trials - k) / (k + 1.0) * odds;
            double second = term * i * i;
            (sum0, sum1, sum2) = (sum0 + term, sum1 + term * i, sum2 + second);
            if (k > trials * rate && second <= 1e-17 * sum2)
                break;
        }

        return new BinomialMoments(Binomial.LogMass(trials, limit, rate), sum0, sum1, sum2);
    }
}
