namespace Assize.Bounds;

/// <summary>The Kullback–Leibler divergence of one rate from another, and its inverses.</summary>
public static class Divergence
{
    const double Precision = 4e-16;

    /// <summary>How fast evidence against one rate gathers, a trial, when another is observed.</summary>
    /// <param name="observed">The rate observed, in [0, 1].</param>
    /// <param name="rate">The rate it is held against, in [0, 1].</param>
    /// <returns>x ln(x/p) + (1-x) ln((1-x)/(1-p)), in [0, ∞]; relative error below 5e-13.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A rate lies outside [0, 1], or is NaN.</exception>
    public static double Bernoulli(double observed, double rate)
    {
        Check.Probability(observed, nameof(observed));
        Check.Probability(rate, nameof(rate));
        double excess = rate - observed;
        return Part(observed, excess, rate) + Part(1 - observed, -excess, 1 - rate);
    }

    // x ln(x/p) + p - x, where p = x + excess.
    static double Part(double observed, double excess, double rate)
    {
        if (observed == 0)
            return excess;
        if (rate == 0)
            return double.PositiveInfinity;

        double relative = excess / observed;
        return relative > -0.5
            ? observed * Elementary.LogShortfall(relative)
            : observed * (relative - Elementary.Log(rate / observed));
    }
}
