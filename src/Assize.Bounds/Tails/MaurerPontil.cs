namespace Assize.Bounds;

/// <summary>How far the average of values in a range may stray, measured by the variance of those very
/// values.</summary>
/// <remarks>
/// <para>Holds for: independent values of one law in a known range; the variance need not be known.</para>
/// <para>Guarantee: at least the true margin, at every number of trials from 2 on.</para>
/// <para>Accuracy: within 1e-11 of the formulas, rounded up; conservative: about three times the trials of a known
/// variance.</para>
/// <para>Source: A. Maurer and M. Pontil, COLT 2009 (arXiv 0907.3740), Theorems 4 and 10, from memory; the two-sided
/// form shares the variance event.</para>
/// </remarks>
public static class MaurerPontil
{
    // One average beyond its bound, and one variance; or two averages and the same variance.
    const int OneSide = 2;
    const int BothSides = 3;

    /// <summary>The margin by which the mean may exceed the average, or the average the mean, to one side.</summary>
    /// <param name="trials">Number of values averaged, at least 2.</param>
    /// <param name="variance">The values' own unbiased variance, in [0, 1e300]; squared unit of the values.</param>
    /// <param name="range">Greatest minus least possible value, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability that the margin is exceeded, in [1e-300, 1).</param>
    /// <returns>√(2·variance·L/n) + 7·range·L/(3(n - 1)) with L = ln(2/risk), rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double variance, double range, double risk) =>
        Margin(trials, variance, range, risk, OneSide);

    /// <summary>The margin by which mean and average may differ to either side.</summary>
    /// <param name="trials">Number of values averaged, at least 2.</param>
    /// <param name="variance">The values' own unbiased variance, in [0, 1e300]; squared unit of the values.</param>
    /// <param name="range">Greatest minus least possible value, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability that the margin is exceeded to either side, in [1e-300, 1).</param>
    /// <returns>The same with L = ln(3/risk).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double EitherRadius(long trials, double variance, double range, double risk) =>
        Margin(trials, variance, range, risk, BothSides);

    /// <summary>How many values give a margin to one side, if their own variance turns out to be no more than
    /// expected.</summary>
    /// <param name="variance">The unbiased variance expected, in [0, 1e300]; squared unit of the values.</param>
    /// <param name="range">Greatest minus least possible value, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability that the margin is exceeded, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, whose <see cref="Radius"/> is at most the margin; null beyond
    /// 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double variance, double range, double margin, double risk) =>
        Needed(variance, range, margin, risk, OneSide);

    /// <summary>How many values give a margin to either side, if their own variance turns out to be no more than
    /// expected.</summary>
    /// <param name="variance">The unbiased variance expected, in [0, 1e300]; squared unit of the values.</param>
    /// <param name="range">Greatest minus least possible value, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability that the margin is exceeded to either side, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, whose <see cref="EitherRadius"/> is at most the margin; null
    /// beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? EitherTrialsNeeded(double variance, double range, double margin, double risk) =>
        Needed(variance, range, margin, risk, BothSides);

    /// <summary>The margin by which the law's standard deviation may exceed the values' own, or fall short of it, to
    /// one side.</summary>
    /// <param name="trials">Number of values, at least 2.</param>
    /// <param name="range">Greatest minus least possible value, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability that the margin is exceeded, in [1e-300, 1).</param>
    /// <returns>range·√(2·ln(1/risk)/(n - 1)), rounded up; the values' own deviation is the root of their unbiased
    /// variance.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double DeviationRadius(long trials, double range, double risk)
    {
        Require(trials, 0, range, risk);
        return range * Math.Sqrt(-2 * Elementary.Log(risk) / (trials - 1)) * (1 + Enclosure.Rounding);
    }

    static double Margin(long trials, double variance, double range, double risk, int events)
    {
        Require(trials, variance, range, risk);
        double odds = Elementary.Log(events) - Elementary.Log(risk);
        double spread = Math.Sqrt(variance) * Math.Sqrt(2 * odds / trials);
        return (spread + 7 * odds / (3.0 * (trials - 1)) * range) * (1 + Enclosure.Rounding);
    }

    static long? Needed(double variance, double range, double margin, double risk, int events)
    {
        Require(2, variance, range, risk);
        Check.Between(margin, 1e-150, 1e150, nameof(margin));

        // n·margin - √(2·variance·L·n) - 7·range·L/3 = 0, near enough for a start.
        double odds = Elementary.Log(events) - Elementary.Log(risk);
        double half = Math.Sqrt(variance) / margin * Math.Sqrt(odds / 2);
        double root = half + Math.Sqrt(half * half + 7 * odds / 3 * (range / margin));
        long found = IntegerSearch.First(
            2,
            RatePlan.MaximumTrials,
            (long)Math.Min(root * root, RatePlan.MaximumTrials),
            trials => Margin(trials, variance, range, risk, events) <= margin);
        return found <= RatePlan.MaximumTrials ? found : null;
    }

    static void Require(long trials, double variance, double range, double risk)
    {
        Check.AtLeast(trials, 2, nameof(trials));
        Check.Between(variance, 0, 1e300, nameof(variance));
        Check.Between(range, 1e-150, 1e150, nameof(range));
        Check.Risk(risk, nameof(risk));
    }
}
