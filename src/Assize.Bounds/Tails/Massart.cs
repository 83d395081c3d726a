namespace Assize.Bounds;

/// <summary>The closed bound on how far an empirical distribution function may stray from the true one.</summary>
/// <remarks>
/// <para>Holds for: independent values of any one law, ties included.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; the constant cannot be improved.</para>
/// <para>Accuracy: within 2e-11 of the formula, rounded up.</para>
/// <para>Source: P. Massart, Ann. Probab. 18 (1990) 1269–1283, Theorem 1 and Corollary 1, after Dvoretzky, Kiefer and
/// Wolfowitz (1956); the constant as restated by F. Wei and R. M. Dudley, arXiv 1107.5356.</para>
/// </remarks>
public static class Massart
{
    /// <summary>The probability that the empirical distribution function strays to one side somewhere by more than a
    /// distance.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="distance">The distance, in [0, 1].</param>
    /// <returns>[0, exp(-2 · trials · distance²)] where that is at most ½, else [0, 1].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double distance)
    {
        var bound = Exponential(trials, distance);
        return bound.Upper <= 0.5 ? bound : new Enclosure(0, 1);
    }

    /// <summary>The probability that the empirical distribution function strays to either side somewhere by more than a
    /// distance.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="distance">The distance, in [0, 1].</param>
    /// <returns>[0, 2 · exp(-2 · trials · distance²)], at most 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure EitherTail(long trials, double distance) =>
        new(0, Math.Min(1, 2 * Exponential(trials, distance).Upper));

    /// <summary>The distance that is exceeded to either side with no more than a given probability.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="risk">The probability, in (0, 1).</param>
    /// <returns>√(ln(2/risk) / (2 · trials)), rounded up; from 1 on no distance is exceeded.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double EitherRadius(long trials, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Inside(risk, 0, 1, nameof(risk));
        return Math.Sqrt((Elementary.Log(2) - Elementary.Log(risk)) / (2.0 * trials)) * (1 + Enclosure.Rounding);
    }

    /// <summary>How many values it takes so that a distance is exceeded to either side with no more than a given
    /// probability.</summary>
    /// <param name="distance">The distance, in (0, 1].</param>
    /// <param name="risk">The probability, in (0, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="EitherTail"/> is at most the risk; null
    /// beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? EitherTrialsNeeded(double distance, double risk)
    {
        Check.Between(distance, double.Epsilon, 1, nameof(distance));
        Check.Inside(risk, 0, 1, nameof(risk));
        double guess = (Elementary.Log(2) - Elementary.Log(risk)) / distance / distance / 2;
        return RateTheorem.First(guess, trials => EitherTail(trials, distance).Upper <= risk);
    }

    static Enclosure Exponential(long trials, double distance)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Probability(distance, nameof(distance));
        return Enclosure.UpToExponential(2.0 * trials * distance * distance);
    }
}
