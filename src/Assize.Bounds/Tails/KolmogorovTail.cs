namespace Assize.Bounds;

/// <summary>How far an empirical distribution function may stray from the true one.</summary>
/// <remarks>
/// <para>Holds for: independent values of one law; exact when the law is continuous, else at least the true
/// probability.</para>
/// <para>Guarantee: the probability for a continuous law lies inside the enclosure, and that for any law is no
/// greater.</para>
/// <para>Accuracy: the ends are within 2e-11 of the truth while it is above 1e-300: one-sided up to 10,000,000 trials,
/// two-sided up to 2,000 or beyond a distance of ½.</para>
/// <para>Source: N. V. Smirnov (1944) and Z. W. Birnbaum and F. H. Tingey, Ann. Math. Statist. 22 (1951) 592–596, for
/// one side; J. Durbin (1973), for two; P. Massart, Ann. Probab. 18 (1990) 1269–1283, for more trials (from
/// memory).</para>
/// </remarks>
public static class KolmogorovTail
{
    /// <summary>Up to so many trials the one-sided probability is summed exactly.</summary>
    public const int OneSidedTrials = 10_000_000;

    /// <summary>Up to so many trials the two-sided probability is summed exactly.</summary>
    public const int TwoSidedTrials = 2_000;

    const double Rounding = 1e-11;

    /// <summary>The probability that the empirical distribution function rises above the true one somewhere by a
    /// distance.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="distance">The distance, in (0, 1].</param>
    /// <returns>An enclosure of P(sup(Fₙ - F) ≥ distance) for a continuous law; beyond
    /// <see cref="OneSidedTrials"/> values that of <see cref="Massart"/>.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure OneSided(long trials, double distance)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(distance, double.Epsilon, 1, nameof(distance));
        if (distance == 1)
            return new Enclosure(0, 0);
        if (trials > OneSidedTrials)
            return Massart.Tail(trials, distance);

        double sum = Math.Min(1, SmirnovSum(trials, distance));
        return Enclosure.Widened(sum, sum, Rounding);
    }

    /// <summary>The probability that the empirical distribution function strays from the true one somewhere by a
    /// distance.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="distance">The distance, in (0, 1].</param>
    /// <returns>An enclosure of P(sup|Fₙ - F| ≥ distance) for a continuous law; beyond <see cref="TwoSidedTrials"/>
    /// values and up to a distance of ½ from one side's probability to twice that, or the bound of
    /// <see cref="Massart"/>.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure TwoSided(long trials, double distance)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(distance, double.Epsilon, 1, nameof(distance));
        if (distance <= 0.5 && trials <= TwoSidedTrials)
        {
            double exact = Math.Min(1, KolmogorovWalk.Leaves((int)trials, trials * distance));
            return Enclosure.Widened(exact, exact, Rounding);
        }

        // Straying above and below by more than half at once is impossible.
        var one = OneSided(trials, distance);
        return new Enclosure(
            Math.Min(1, distance > 0.5 ? 2 * one.Lower : one.Lower),
            Math.Min(Math.Min(1, 2 * one.Upper), Massart.EitherTail(trials, distance).Upper));
    }

    // d Σ C(n, j) q^(j-1) (1 - q)^(n-j), q = d + j/n: binomial masses whose mean exceeds their count by exactly n·d.
    static double SmirnovSum(long trials, double distance)
    {
        double sum = 0, reach = trials * distance;
        for (long j = 0; j < trials - reach; j++)
        {
            double rest = trials - j - reach;
            double exponent = StirlingError.OfBinomial(trials, j)
                - CountDeviance.Of(j, reach, j + reach) - CountDeviance.Of(trials - j, -reach, rest);
            sum += reach / (j + reach) * Elementary.Exp(exponent);
        }

        return sum;
    }
}
