namespace Assize.Bounds;

/// <summary>Probabilities of the number of marked items in a draw without replacement.</summary>
/// <remarks>
/// Relative error below 5e-13 while the result is above 1e-300, for populations up to 1e9. Source: the mass as a
/// quotient of binomial masses at the draw's own rate (C. Loader, 2000); every deviance follows from one exact
/// difference.
/// </remarks>
public static class Hypergeometric
{
    const long MaximumPopulation = 2_000_000_000;

    /// <summary>The logarithm of the probability of exactly so many.</summary>
    /// <param name="population">Items in all, in [1, 2e9].</param>
    /// <param name="marked">Marked items, in [0, population].</param>
    /// <param name="drawn">Items drawn, in [0, population].</param>
    /// <param name="successes">Marked items drawn; where impossible, the probability is 0.</param>
    /// <returns>ln P(S = successes), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain.</exception>
    public static double LogMass(long population, long marked, long drawn, long successes)
    {
        Require(population, marked, drawn);
        if (successes < Least(population, marked, drawn) || successes > Math.Min(marked, drawn))
            return double.NegativeInfinity;

        // marked · drawn / population - successes: the same excess, up to sign, in all four cells of the table.
        double excess = (double)(marked * drawn - successes * population) / population;
        double rate = (double)drawn / population;
        double left = Cells(successes, marked - successes, excess, rate);
        double right = Cells(drawn - successes, population - marked - (drawn - successes), -excess, rate);
        return Math.Min(0, left + right - Cells(drawn, population - drawn, 0, rate));
    }

    /// <summary>The logarithm of the probability of so many or more; it does not underflow.</summary>
    /// <param name="population">Items in all, in [1, 2e9].</param>
    /// <param name="marked">Marked items, in [0, population].</param>
    /// <param name="drawn">Items drawn, in [0, population].</param>
    /// <param name="successes">Least number of marked items drawn.</param>
    /// <returns>ln P(S ≥ successes), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain.</exception>
    public static double LogUpperTail(long population, long marked, long drawn, long successes)
    {
        Require(population, marked, drawn);
        if (successes <= Least(population, marked, drawn))
            return 0;
        if (successes > Math.Min(marked, drawn))
            return double.NegativeInfinity;

        return successes > Mode(population, marked, drawn)
            ? Math.Min(0, LogMass(population, marked, drawn, successes)
                + Elementary.Log(Outward(population, marked, drawn, successes)))
            : Elementary.LogOnePlus(-Elementary.Exp(LogLowerTail(population, marked, drawn, successes - 1)));
    }

    /// <summary>The logarithm of the probability of so many or fewer; it does not underflow.</summary>
    /// <param name="population">Items in all, in [1, 2e9].</param>
    /// <param name="marked">Marked items, in [0, population].</param>
    /// <param name="drawn">Items drawn, in [0, population].</param>
    /// <param name="successes">Greatest number of marked items drawn.</param>
    /// <returns>ln P(S ≤ successes), in [-∞, 0].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain.</exception>
    public static double LogLowerTail(long population, long marked, long drawn, long successes)
    {
        Require(population, marked, drawn);
        if (successes < Least(population, marked, drawn))
            return double.NegativeInfinity;
        if (successes >= Math.Min(marked, drawn))
            return 0;

        // Counting the marked items left behind instead of those drawn turns the lower tail into an upper one.
        return successes <= Mode(population, marked, drawn)
            ? Math.Min(0, LogMass(population, marked, drawn, successes)
                + Elementary.Log(Outward(population, marked, population - drawn, marked - successes)))
            : Elementary.LogOnePlus(-Elementary.Exp(LogUpperTail(population, marked, drawn, successes + 1)));
    }

    static void Require(long population, long marked, long drawn)
    {
        Check.AtLeast(population, 1, nameof(population));
        Check.AtMost(population, MaximumPopulation, nameof(population));
        Check.Between(marked, 0, population, nameof(marked));
        Check.Between(drawn, 0, population, nameof(drawn));
    }

    static long Least(long population, long marked, long drawn) => Math.Max(0, drawn + marked - population);

    static long Mode(long population, long marked, long drawn) =>
        (long)((marked + 1.0) * ((drawn + 1.0) / (population + 2.0)));

    // ln of a binomial mass at a rate where the mean exceeds the successes by so much.
    static double Cells(double successes, double failures, double excess, double rate)
    {
        double all = successes + failures;
        double deviances = CountDeviance.Of(successes, excess, all * rate)
            + CountDeviance.Of(failures, -excess, all * (1 - rate));
        return successes == 0 || failures == 0
            ? -deviances
            : StirlingError.Of(all) - StirlingError.Of(successes) - StirlingError.Of(failures) - deviances
                + 0.5 * Elementary.Log(all / (2 * Math.PI * successes * failures));
    }

    // 1 + the mass ratios further out; beyond the mode they fall.
    static double Outward(double population, double marked, double drawn, double successes)
    {
        double term = 1, sum = 1;
        for (double s = successes; s < Math.Min(marked, drawn); s++)
        {
            term *= (marked - s) / (s + 1) * ((drawn - s) / (population - marked - drawn + s + 1));
            sum += term;
            if (term <= 1e-17 * sum)
                return sum;
        }

        return sum;
    }
}
