namespace Assize.Bounds;

/// <summary>How far an average may stray from its mean when nothing but the spread is known.</summary>
/// <remarks>
/// <para>Holds for: uncorrelated values whose variances average to at most <c>variance</c>.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; a single value of two or three points
/// reaches it.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up.</para>
/// <para>Source: F. P. Cantelli (1928) for one side, P. L. Chebyshev (1867) for both; common practice, proved on the
/// page.</para>
/// </remarks>
public static class Cantelli
{
    /// <summary>The probability that the average strays to one side by a margin.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <returns>[0, variance/(variance + n·margin²)].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double variance, double margin) =>
        Enclosure.UpTo(1 / (1 + Ratio(trials, variance, margin)));

    /// <summary>The probability that the average strays to either side by a margin (Chebyshev's inequality).</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <returns>[0, variance/(n·margin²)], at most 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure EitherTail(long trials, double variance, double margin) =>
        Enclosure.UpTo(1 / Ratio(trials, variance, margin));

    /// <summary>The margin that is reached to one side with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>√(variance·(1 - risk)/(n·risk)), rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double variance, double risk)
    {
        Require(trials, variance);
        Check.Risk(risk, nameof(risk));
        return Math.Sqrt(variance / trials) * Math.Sqrt((1 - risk) / risk) * (1 + Enclosure.Rounding);
    }

    /// <summary>The margin that is reached to either side with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>√(variance/(n·risk)), rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double EitherRadius(long trials, double variance, double risk)
    {
        Require(trials, variance);
        Check.Risk(risk, nameof(risk));
        return Math.Sqrt(variance / trials) / Math.Sqrt(risk) * (1 + Enclosure.Rounding);
    }

    /// <summary>How many values the average needs so that it strays to one side by a margin with no more than a given
    /// probability.</summary>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="Tail"/> is at most the risk; null beyond
    /// 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double variance, double margin, double risk)
    {
        Check.Risk(risk, nameof(risk));
        double guess = (1 - risk) / risk / Ratio(1, variance, margin);
        return RateTheorem.First(guess, trials => Tail(trials, variance, margin).Upper <= risk);
    }

    /// <summary>How many values the average needs so that it strays to either side by a margin with no more than a
    /// given probability.</summary>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="EitherTail"/> is at most the risk; null
    /// beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? EitherTrialsNeeded(double variance, double margin, double risk)
    {
        Check.Risk(risk, nameof(risk));
        double guess = 1 / risk / Ratio(1, variance, margin);
        return RateTheorem.First(guess, trials => EitherTail(trials, variance, margin).Upper <= risk);
    }

    static double Ratio(long trials, double variance, double margin)
    {
        Require(trials, variance);
        Check.Between(margin, 1e-150, 1e150, nameof(margin));
        return trials * (margin * margin / variance);
    }

    static void Require(long trials, double variance)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.Between(variance, 1e-300, 1e300, nameof(variance));
    }
}
