namespace Assize.Bounds;

/// <summary>How far an average may stray from its mean when the spread and the kurtosis are known.</summary>
/// <remarks>
/// <para>Holds for: independent values of one mean, each with the given bounds on its standard deviation and
/// kurtosis.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; a single value of two points reaches
/// it.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up.</para>
/// <para>Source: Markov's inequality for the fourth power of the sum, whose mean is nκσ⁴ + 3n(n - 1)σ⁴; common
/// practice, proved on the page.</para>
/// </remarks>
public static class FourthMoment
{
    /// <summary>The probability that the average strays to either side by a margin.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150]; 3 for a normal law.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <returns>[0, (nκ + 3n(n - 1))·(deviation/(n·margin))⁴], at most 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure EitherTail(long trials, double deviation, double kurtosis, double margin)
    {
        Require(trials, deviation, kurtosis);
        Check.Between(margin, 1e-150, 1e150, nameof(margin));

        // The root of the bound leaves the range of numbers only where the bound itself is 1 or below 1e-300.
        double ratio = deviation / margin;
        double root = Spread(trials, kurtosis) / trials * ratio * ratio;
        return Enclosure.UpTo(root * root);
    }

    /// <summary>The margin that is reached to either side with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150].</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>(deviation/√n)·((3 + (κ - 3)/n)/risk)^¼, rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double EitherRadius(long trials, double deviation, double kurtosis, double risk)
    {
        Require(trials, deviation, kurtosis);
        Check.Risk(risk, nameof(risk));
        double scaled = Math.Sqrt(Spread(trials, kurtosis) / Math.Sqrt(risk));
        return deviation / Math.Sqrt(trials) * scaled * (1 + Enclosure.Rounding);
    }

    /// <summary>How many values the average needs so that it strays to either side by a margin with no more than a
    /// given probability.</summary>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="kurtosis">Bound on E(X - EX)⁴/σ⁴, in [1, 1e150].</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="EitherTail"/> is at most the risk; null
    /// beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? EitherTrialsNeeded(double deviation, double kurtosis, double margin, double risk)
    {
        Check.Risk(risk, nameof(risk));
        double ratio = deviation / margin;
        double guess = Math.Sqrt(3 / risk) * ratio * ratio;
        return RateTheorem.First(guess, trials => EitherTail(trials, deviation, kurtosis, margin).Upper <= risk);
    }

    // √(E(S - ES)⁴)/(nσ²): falls, or stays, as n grows, since κ ≥ 1.
    static double Spread(long trials, double kurtosis) => Math.Sqrt(3 * (1 - 1.0 / trials) + kurtosis / trials);

    static void Require(long trials, double deviation, double kurtosis)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(deviation, 1e-150, 1e150, nameof(deviation));
        Check.Between(kurtosis, 1, 1e150, nameof(kurtosis));
    }
}
