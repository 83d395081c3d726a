namespace Assize.Bounds;

/// <summary>How far the average of independent values of known spread may stray above its mean, in closed
/// form.</summary>
/// <remarks>
/// <para>Holds for: independent values, each at most <c>bound</c> above its mean, their variances averaging to at most
/// <c>variance</c>.</para>
/// <para>Guarantee: at least the true probability, at every number of trials; never below Bennett's.</para>
/// <para>Accuracy: within 1e-11 of the formula, rounded up.</para>
/// <para>Source: S. Boucheron, G. Lugosi, P. Massart, Concentration Inequalities (2013), (2.10); from memory.</para>
/// </remarks>
public static class Bernstein
{
    /// <summary>The probability that the average reaches a margin above its mean.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in [0, ∞); unit of the values.</param>
    /// <returns>[0, exp(-n·margin²/(2(variance + bound·margin/3)))].</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Tail(long trials, double variance, double bound, double margin)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(variance, bound);
        Check.Between(margin, 0, double.MaxValue, nameof(margin));
        return margin == 0
            ? new Enclosure(0, 1)
            : Enclosure.UpToExponential(trials * margin / (2 * (variance / margin + bound / 3)));
    }

    /// <summary>The margin that is exceeded upwards with no more than a given probability.</summary>
    /// <param name="trials">Number of values averaged, at least 1.</param>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>L·bound/(3n) + √((L·bound/(3n))² + 2·L·variance/n) with L = ln(1/risk), rounded up.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static double Radius(long trials, double variance, double bound, double risk)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Require(variance, bound);
        Check.Risk(risk, nameof(risk));

        // n·t² - (2/3)·L·bound·t - 2·L·variance = 0.
        double share = -Elementary.Log(risk) / trials;
        double half = share * bound / 3;
        return (half + Math.Sqrt(half * half + 2 * share * variance)) * (1 + Enclosure.Rounding);
    }

    /// <summary>How many values the average needs so that a margin is exceeded upwards with no more than a given
    /// probability.</summary>
    /// <param name="variance">Bound on the average variance, in [1e-300, 1e300]; squared unit of the values.</param>
    /// <param name="bound">Bound on a value minus its mean, in [1e-150, 1e150]; unit of the values.</param>
    /// <param name="margin">The margin, in (0, ∞); unit of the values.</param>
    /// <param name="risk">The probability, in [1e-300, 1).</param>
    /// <returns>The first number, and every larger one, for which <see cref="Tail"/> is at most the risk; null beyond
    /// 1e15.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long? TrialsNeeded(double variance, double bound, double margin, double risk)
    {
        Require(variance, bound);
        Check.Between(margin, double.Epsilon, double.MaxValue, nameof(margin));
        Check.Risk(risk, nameof(risk));
        double guess = -2 * Elementary.Log(risk) * (variance / margin + bound / 3) / margin;
        return RateTheorem.First(guess, trials => Tail(trials, variance, bound, margin).Upper <= risk);
    }

    static void Require(double variance, double bound)
    {
        Check.Between(variance, 1e-300, 1e300, nameof(variance));
        Check.Between(bound, 1e-150, 1e150, nameof(bound));
    }

    sealed class OfMeans : MeanTheorem
    {
        public override string Name => "Bernstein";

        public override string Assumes => "independent draws in a range, of bounded standard deviation";

        public override bool Applies(MeanFacts facts) => facts is { Range: not null, StandardDeviation: not null };

        public override double Beyond(MeanFacts facts, long trials, double mean, double margin)
        {
            double deviation = facts.StandardDeviation!.Value;
            return !(margin > 0) ? 1 : Tail(trials, deviation * deviation, BoundAbove(facts, mean), margin).Upper;
        }
    }
}
