namespace Assize.Bounds;

/// <summary>A statistic for the mean of unbounded values of known spread that no outlier can sway.</summary>
/// <remarks>
/// <para>Holds for: independent values of one mean, each of standard deviation at most <c>deviation</c>; nothing else
/// is asked of their law.</para>
/// <para>Guarantee: the statistic passes its limit with no more than the given probability, at every number of
/// trials.</para>
/// <para>Accuracy: within 1e-11 of the formulas, rounded to the safe side.</para>
/// <para>Source: O. Catoni, Ann. Inst. H. Poincaré Probab. Statist. 48 (2012) 1148–1185, (2.1) and Proposition 2.4
/// (from memory); every bound here is derived on the page from E exp(±Σψ).</para>
/// </remarks>
public static class Catoni
{
    const double LogTwo = 0.693147180559945309417;

    /// <summary>The influence of one scaled deviation: it grows like a logarithm, so that one value cannot
    /// decide.</summary>
    /// <param name="deviation">A deviation from the centre times the scale; any number.</param>
    /// <returns>sign(x)·ln(1 + |x| + x²/2); infinite where the deviation is.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The deviation is NaN.</exception>
    public static double Influence(double deviation)
    {
        Check.Between(deviation, double.NegativeInfinity, double.PositiveInfinity, nameof(deviation));
        double size = Math.Abs(deviation);
        double influence = size < 1e100
            ? Elementary.LogOnePlus(size * (1 + size / 2))
            : 2 * Elementary.Log(size) - LogTwo;
        return deviation < 0 ? -influence : influence;
    }

    /// <summary>The probability that the influences about a point a margin above the mean add up to 0 or
    /// more.</summary>
    /// <remarks>The point where they add up to 0 is an estimate of the mean: it exceeds the mean by the margin with no
    /// more than this probability, and falls short of it by the margin with no more than this probability.</remarks>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [0, 1e150]; unit of the values.</param>
    /// <returns>[0, exp(-n·margin²/(2(deviation² + margin²)))], at <see cref="CentreScale"/>.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double deviation, double margin)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(deviation, nameof(deviation));
        Check.Between(margin, 0, 1e150, nameof(margin));
        double ratio = deviation / margin;
        return margin == 0 ? new Enclosure(0, 1) : Enclosure.UpToExponential(trials / (2 * (ratio * ratio + 1)));
    }

    /// <summary>The scale of every deviation for which <see cref="Tail"/> holds.</summary>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <returns>margin/(deviation² + margin²), in reciprocal units of the values.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double CentreScale(double deviation, double margin)
    {
        Require(deviation, nameof(deviation));
        Require(margin, nameof(margin));
        return 1 / (deviation / margin * deviation + margin);
    }

    /// <summary>The margin by which the estimate strays to one side with no more than a given probability.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>deviation·√(2L/(n - 2L)) with L = ln(1/risk), rounded up; infinite when n ≤ 2L.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double deviation, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(deviation, nameof(deviation));
        Check.Risk(risk, nameof(risk));
        double twice = -2 * Elementary.Log(risk) * (1 + Enclosure.Rounding);
        return trials > twice ? deviation * Math.Sqrt(twice / (trials - twice)) * (1 + Enclosure.Rounding)
            : double.PositiveInfinity;
    }

    /// <summary>How many values the estimate needs so that it strays to one side by a margin with no more than a given
    /// probability.</summary>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="Tail"/> is at most the risk, ⌈2L(1 +
    /// deviation²/margin²)⌉; null beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double deviation, double margin, double risk)
    {
        Require(deviation, nameof(deviation));
        Require(margin, nameof(margin));
        Check.Risk(risk, nameof(risk));
        double ratio = deviation / margin;
        double guess = -2 * Elementary.Log(risk) * (ratio * ratio + 1);
        return RateTheorem.First(guess, trials => Tail(trials, deviation, margin).Upper <= risk);
    }

    /// <summary>What the sum of influences about the mean passes to one side with no more than a given
    /// probability.</summary>
    /// <param name="trials">Number of values, at least 1.</param>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="scale">The factor of every deviation, in [1e-300, 1e300]; reciprocal unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>n·(scale·deviation)²/2 + ln(1/risk), rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Limit(long trials, double deviation, double scale, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(deviation, nameof(deviation));
        Check.Between(scale, 1e-300, 1e300, nameof(scale));
        Check.Risk(risk, nameof(risk));
        double scaled = scale * deviation;
        return (trials * scaled * scaled / 2 - Elementary.Log(risk)) * (1 + Enclosure.Rounding);
    }

    /// <summary>How many values keep both errors when the mean at the defect is a gap away from the edge.</summary>
    /// <param name="deviation">Bound on the standard deviation, for defective code too, in [1e-150, 1e150]; unit of the
    /// values.</param>
    /// <param name="gap">The distance between edge and defect, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability of a false failure allowed to one side, in [1e-300, 1).</param>
    /// <param name="miss">The probability of a missed defect allowed, in [1e-300, 1).</param>
    /// <returns>⌈2(2·deviation²/gap² + 1)(ln(1/risk) + ln(1/miss))⌉; null beyond 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double deviation, double gap, double risk, double miss)
    {
        Require(deviation, nameof(deviation));
        Require(gap, nameof(gap));
        Check.Risk(risk, nameof(risk));
        Check.Risk(miss, nameof(miss));
        double ratio = deviation / gap;
        double wanted = -Elementary.Log(risk) - Elementary.Log(miss);
        double trials = 2 * (2 * ratio * ratio + 1) * wanted * (1 + Enclosure.Rounding);
        return trials <= RatePlan.MaximumTrials ? (long)Math.Ceiling(trials) : null;
    }

    /// <summary>The scale at which the number of trials for both errors suffices, judged by
    /// <see cref="Limit"/>.</summary>
    /// <param name="deviation">Bound on the standard deviation, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="gap">The distance between edge and defect, in [1e-150, 1e150]; unit of the values.</param>
    /// <returns>gap/(2·deviation² + gap²), in reciprocal units of the values.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Scale(double deviation, double gap)
    {
        Require(deviation, nameof(deviation));
        Require(gap, nameof(gap));
        return 1 / (2 * (deviation / gap) * deviation + gap);
    }

    static void Require(double value, string name) => Check.Between(value, 1e-150, 1e150, name);
}
