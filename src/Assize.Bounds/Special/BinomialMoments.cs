namespace Assize.Bounds;

/// <summary>How a binomial count is distributed from a limit on: its mass there and the sums of its excess over the
/// limit.</summary>
/// <remarks>Sums of positive terms only; from the mean on they fall, in the end like a geometric series.</remarks>
readonly struct BinomialMoments
{
    BinomialMoments(double mass, double above, double sum0, double sum1, double sum2) =>
        (Mass, Above, Sum0, Sum1, Sum2) = (mass, above, sum0, sum1, sum2);

    /// <summary>ln P(B = limit).</summary>
    public double Mass { get; }

    /// <summary>limit - E B, without cancellation.</summary>
    public double Above { get; }

    /// <summary>Σ P(B = limit + i) / P(B = limit).</summary>
    public double Sum0 { get; }

    /// <summary>Σ i · P(B = limit + i) / P(B = limit).</summary>
    public double Sum1 { get; }

    /// <summary>Σ i² · P(B = limit + i) / P(B = limit).</summary>
    public double Sum2 { get; }

    /// <summary>Of the successes, from a limit at the mean or above it.</summary>
    public static BinomialMoments From(long trials, long limit, double rate)
    {
        var mean = Twofold.Product(trials, rate);
        double mass = Binomial.LogMass(trials, limit, rate);
        return Sum(mass, limit - mean.Upper - mean.Lower, trials, limit, rate / (1 - rate));
    }

    /// <summary>Of the failures, from a limit at their mean or above it; the rate is still that of a success.</summary>
    public static BinomialMoments OfFailures(long trials, long limit, double rate)
    {
        var mean = Twofold.Product(trials, rate);
        double mass = Binomial.LogMass(trials, trials - limit, rate);
        return Sum(mass, limit - trials + mean.Upper + mean.Lower, trials, limit, (1 - rate) / rate);
    }

    static BinomialMoments Sum(double mass, double above, long trials, long limit, double odds)
    {
        double term = 1, sum0 = 1, sum1 = 0, sum2 = 0;
        for (long k = limit; k < trials; k++)
        {
            double i = k - limit + 1;
            double ratio = (trials - k) / (k + 1.0) * odds;
            term *= ratio;
            double second = term * i * i;
            (sum0, sum1, sum2) = (sum0 + term, sum1 + term * i, sum2 + second);
            if (ratio < 1 && second <= 1e-17 * sum2)
                break;
        }

        return new BinomialMoments(mass, above, sum0, sum1, sum2);
    }
}
