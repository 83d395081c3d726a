namespace Assize.Bounds;

/// <summary>How far the empirical distribution functions of two samples of one law may stray from each other.</summary>
/// <remarks>
/// <para>Holds for: independent values of one law in two samples; exact when the law is continuous, else at least the
/// true probability.</para>
/// <para>Guarantee: the probability for a continuous law lies inside the enclosure, and that for any law is no
/// greater.</para>
/// <para>Accuracy: the ends are within 1e-10 of the truth while it is above 1e-300, for samples of one size, and within
/// 1e-12 and 2e-15 a value where the product of the sizes is at most 4,000,000; else an upper end only.</para>
/// <para>Source: B. V. Gnedenko and V. S. Korolyuk (1951) for samples of one size, J. L. Hodges, Ark. Mat. 3 (1958)
/// 469–486, for the paths (both from memory); P. Massart, Ann. Probab. 18 (1990) 1269–1283, on each sample
/// beyond.</para>
/// </remarks>
public static class TwoSampleTail
{
    /// <summary>Up to this product of the sizes every path is followed.</summary>
    public const long ExactProduct = 4_000_000;

    // Above the error of a logarithm of up to 690.
    const double Rounding = 2e-11;

    // Above three roundings a step, and two places where a path may leave.
    const double StepRounding = 1e-15;

    /// <summary>The probability that the first sample's function rises above the second one's somewhere by a
    /// distance.</summary>
    /// <param name="first">Number of values in the first sample, in [1, 1e9].</param>
    /// <param name="second">Number of values in the second sample, in [1, 1e9].</param>
    /// <param name="distance">The distance, in (0, 1]; within 1e-6 of the least difference above an attainable one it
    /// counts as that one.</param>
    /// <returns>An enclosure of P(sup(F - G) ≥ distance) for a continuous law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure OneSided(long first, long second, double distance)
    {
        Require(first, second, distance);
        if (first == second)
            return Widened(Ratio(first, Level(first, distance)));
        if (first * second <= ExactProduct)
            return Leaving(first, second, Level(first * second, distance), oneSided: true);

        double each = EachSample(first, second, distance);
        return new Enclosure(0, each <= 0.5 ? Math.Min(1, 2 * each) : 1);
    }

    /// <summary>The probability that the two functions stray from each other somewhere by a distance.</summary>
    /// <param name="first">Number of values in the first sample, in [1, 1e9].</param>
    /// <param name="second">Number of values in the second sample, in [1, 1e9].</param>
    /// <param name="distance">The distance, in (0, 1]; within 1e-6 of the least difference above an attainable one it
    /// counts as that one.</param>
    /// <returns>An enclosure of P(sup|F - G| ≥ distance) for a continuous law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure TwoSided(long first, long second, double distance)
    {
        Require(first, second, distance);
        if (first == second)
            return EitherOfEqual(first, Level(first, distance));
        if (first * second <= ExactProduct)
            return Leaving(first, second, Level(first * second, distance), oneSided: false);

        return new Enclosure(0, Math.Min(1, 4 * EachSample(first, second, distance)));
    }

    static void Require(long first, long second, double distance)
    {
        Check.AtLeast(first, 1, nameof(first));
        Check.AtMost(first, 1_000_000_000, nameof(first));
        Check.AtLeast(second, 1, nameof(second));
        Check.AtMost(second, 1_000_000_000, nameof(second));
        Check.Between(distance, double.Epsilon, 1, nameof(distance));
    }

    static long Level(long parts, double distance) => Math.Max(1, (long)Math.Ceiling(parts * distance - 1e-6));

    static Enclosure Widened(double probability) =>
        Enclosure.Widened(Math.Min(1, probability), Math.Min(1, probability), Rounding);

    // C(2n, n - k) / C(2n, n), by reflection the probability that a path of n steps each way ever leads by k.
    static double Ratio(long size, long level) => level > size
        ? 0
        : Elementary.Exp(Binomial.LogMass(2 * size, size - level, 0.5) - Binomial.LogMass(2 * size, size, 0.5));

    // 2 Σ (-1)^(i-1) C(2n, n - ik) / C(2n, n). Where next to every path leaves, a wider band that nearly all leave too
    // bounds the probability from below.
    static Enclosure EitherOfEqual(long size, long level)
    {
        long wide = Math.Max(level, (long)Math.Ceiling(Math.Sqrt(size / 20.0)));
        double sum = 0;
        for (long i = 1; i * wide <= size; i++)
        {
            double term = Ratio(size, i * wide);
            sum += i % 2 == 1 ? 2 * term : -2 * term;
            if (term < 1e-18 * sum)
                break;
        }

        var tail = Widened(sum);
        return wide > level ? new Enclosure(tail.Lower, 1) : tail;
    }

    // The order of all values is that of draws without replacement; the leaving paths' probabilities are all positive.
    static Enclosure Leaving(long first, long second, long level, bool oneSided)
    {
        var alive = new double[second + 1];
        alive[0] = 1;
        double left = 0;
        for (long i = 0; i <= first; i++)
        {
            for (long j = 0; j <= second; j++)
            {
                double mass = alive[j];
                long lead = i * second - j * first;
                if (lead >= level || (!oneSided && -lead >= level))
                {
                    left += mass;
                    alive[j] = 0;
                    continue;
                }

                double rest = first + second - i - j;
                if (j < second)
                    alive[j + 1] += mass * ((second - j) / rest);
                alive[j] = i < first ? mass * ((first - i) / rest) : 0;
            }
        }

        left = Math.Min(1, left);
        return Enclosure.Widened(left, left, StepRounding * (first + second) + 1e-12);
    }

    // One of the samples strays from the truth by its share of the distance; the shares that make both equally likely.
    static double EachSample(long first, long second, double distance)
    {
        double root = Math.Sqrt(first) / (1 + Math.Sqrt(first / (double)second)) * distance;
        return Enclosure.UpToExponential(2 * root * root * (1 - 1e-14)).Upper;
    }
}
