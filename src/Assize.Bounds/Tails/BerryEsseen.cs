namespace Assize.Bounds;

/// <summary>How far the sum of independent draws may be from its normal approximation.</summary>
/// <remarks>
/// <para>Holds for: independent draws with third absolute central moments and a positive variance in all; with a better
/// constant where they share one law.</para>
/// <para>Guarantee: the true probability lies inside the enclosure, at every number of trials; it bounds from below
/// too, so it can prove
/// a test flaky. The error is additive: nothing is said about probabilities far below 1/√trials.</para>
/// <para>Accuracy: for yes/no draws the distance is 1.14 to 1.9 times the true one.</para>
/// <para>Source: I. G. Shevtsova, Inform. Primen. 7 (2013) 124–125: min of 0.4690 r, 0.3322 (r + 0.429), 0.3031 (r +
/// 0.646), over √trials,
/// r the third absolute central moment over the cube of the standard deviation (the reference is from memory); for
/// several laws I. Tyurin, arXiv 0912.0726: 0.5606.</para>
/// </remarks>
public static class BerryEsseen
{
    // Above the rounding of the standardised point, its normal tail and the distance.
    const double Rounding = 1e-10;

    // I. Tyurin (2009), for independent draws that need not share a law.
    const double NonIdentical = 0.5606;

    /// <summary>The greatest distance between the distribution function of the standardised sum and the normal
    /// one.</summary>
    /// <param name="law">The law of one draw; its variance must be positive.</param>
    /// <param name="trials">Number of draws summed, at least 1.</param>
    /// <returns>The bound, in (0, 1], rounded up.</returns>
    /// <exception cref="ArgumentException">The law has no positive variance.</exception>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials is below 1.</exception>
    public static double Distance(Law law, long trials)
    {
        RequireVariance(law);
        Check.AtLeast(trials, 1, nameof(trials));
        return Distance(law.ThirdAbsoluteCentralMoment / (law.Variance * Math.Sqrt(law.Variance)), trials);
    }

    /// <summary>The probability that the sum of draws reaches a total.</summary>
    /// <param name="law">The law of one draw; its variance must be positive.</param>
    /// <param name="trials">Number of draws summed, in [1, 2^52].</param>
    /// <param name="total">The total, finite; same unit as the draws.</param>
    /// <returns>An enclosure of P(sum ≥ total), and of P(sum &gt; total).</returns>
    /// <exception cref="ArgumentException">The law has no positive variance.</exception>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure UpperTail(Law law, long trials, double total) =>
        Around(NormalTail.Upper(Standardised(law, trials, total)), Distance(law, trials));

    /// <summary>The probability that the sum of draws is no more than a total.</summary>
    /// <param name="law">The law of one draw; its variance must be positive.</param>
    /// <param name="trials">Number of draws summed, in [1, 2^52].</param>
    /// <param name="total">The total, finite; same unit as the draws.</param>
    /// <returns>An enclosure of P(sum ≤ total), and of P(sum &lt; total).</returns>
    /// <exception cref="ArgumentException">The law has no positive variance.</exception>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure LowerTail(Law law, long trials, double total) =>
        Around(NormalTail.Lower(Standardised(law, trials, total)), Distance(law, trials));

    /// <summary>The greatest distance between the distribution function of a standardised sum of draws, of one law or of
    /// several, and the normal one.</summary>
    /// <param name="draws">The draws; the variance of their sum must be positive.</param>
    /// <returns>The bound for one law, else 0.5606 Σ E|X - EX|³ / B³, B² the variance of the sum; in (0, 1], rounded
    /// up.</returns>
    /// <exception cref="ArgumentException">The draws have no positive variance.</exception>
    public static double Distance(Draws draws)
    {
        TiltedSum.RequireVariance(draws);
        return draws.Identical
            ? Distance(draws.Groups[0].Law, draws.Groups[0].Count)
            : DistanceOfSeveral(draws.ThirdAbsoluteCentralMoments / (draws.Variance * Math.Sqrt(draws.Variance)));
    }

    /// <summary>The probability that a sum of draws, of one law or of several, reaches a total.</summary>
    /// <param name="draws">The draws; the variance of their sum must be positive.</param>
    /// <param name="total">The total, finite; same unit as the draws.</param>
    /// <returns>An enclosure of P(sum ≥ total), and of P(sum &gt; total).</returns>
    /// <exception cref="ArgumentException">The draws have no positive variance, or the total is not finite.</exception>
    public static Enclosure UpperTail(Draws draws, double total)
    {
        double distance = Distance(draws);
        Check.Finite(total, nameof(total));
        return Around(NormalTail.Upper(-draws.MeanExcess(total) / Math.Sqrt(draws.Variance)), distance);
    }

    /// <summary>The probability that a sum of draws, of one law or of several, is no more than a total.</summary>
    /// <param name="draws">The draws; the variance of their sum must be positive.</param>
    /// <param name="total">The total, finite; same unit as the draws.</param>
    /// <returns>An enclosure of P(sum ≤ total), and of P(sum &lt; total).</returns>
    /// <exception cref="ArgumentException">The draws have no positive variance, or the total is not finite.</exception>
    public static Enclosure LowerTail(Draws draws, double total)
    {
        double distance = Distance(draws);
        Check.Finite(total, nameof(total));
        return Around(NormalTail.Lower(-draws.MeanExcess(total) / Math.Sqrt(draws.Variance)), distance);
    }

    internal static double Distance(double thirdMomentRatio, double trials)
    {
        double r = thirdMomentRatio;
        double constant = Math.Min(0.4690 * r, Math.Min(0.3322 * (r + 0.429), 0.3031 * (r + 0.646)));
        return Math.Min(1, constant / Math.Sqrt(trials) * (1 + Rounding));
    }

    /// <summary>The same for draws of several laws, from the sum of third absolute central moments over B³.</summary>
    internal static double DistanceOfSeveral(double lyapunovRatio) =>
        Math.Min(1, NonIdentical * lyapunovRatio * (1 + Rounding));

    static double Standardised(Law law, long trials, double total)
    {
        RequireVariance(law);
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        Check.Finite(total, nameof(total));
        var mean = Twofold.Product(trials, law.Mean);
        return (total - mean.Upper - mean.Lower) / Math.Sqrt(trials * law.Variance);
    }

    static void RequireVariance(Law law)
    {
        if (law is null)
            throw new ArgumentNullException(nameof(law));
        if (!(law.Variance > 0))
            throw new ArgumentException("The law must have a positive variance.", nameof(law));
    }

    static Enclosure Around(double normal, double distance) => new(
        Math.Max(0, normal * (1 - Rounding) - distance),
        Math.Min(1, normal * (1 + Rounding) + distance));

    sealed class OfRates : RateTheorem
    {
        public override string Name => "Berry–Esseen";

        public override string Assumes => "independent trials of one rate";

        public override long? TrialsNeeded(RatePlan plan, IReadOnlyList<RateSide> sides) =>
            Greatest(sides, side => TrialsNeeded(side, plan.Miss));

        static long? TrialsNeeded(RateSide side, double miss)
        {
            var (edge, defect) = (Law.Bernoulli(side.Edge), Law.Bernoulli(side.Defect));
            if (edge.Variance == 0 || defect.Variance == 0)
                return null;

            double least = Distance(edge, 1) / side.Risk;
            return First(least * least, trials => Suffices(edge, defect, side.Risk, miss, trials));
        }

        // A cut between the means with both bounds met exists when the two normal quantiles fit between them.
        static bool Suffices(Law edge, Law defect, double risk, double miss, long trials)
        {
            double red = (risk - Distance(edge, trials)) * (1 - Rounding);
            double green = (miss - Distance(defect, trials)) * (1 - Rounding);
            if (!(red > 0 && green > 0))
                return false;

            double reach = NormalTail.UpperQuantile(red) * Math.Sqrt(edge.Variance)
                + NormalTail.UpperQuantile(green) * Math.Sqrt(defect.Variance);
            return reach * (1 + Rounding) <= Math.Abs(defect.Mean - edge.Mean) * Math.Sqrt(trials);
        }
    }
}
