namespace Assize.Bounds;

/// <summary>How often independent yes/no trials give so many successes, enclosed relative to the answer, however
/// small it is.</summary>
/// <remarks>
/// <para>Holds for: independent trials that succeed with the same rate.</para>
/// <para>Guarantee: the true probability lies inside the enclosure, at every number of trials, at equal cost.</para>
/// <para>Accuracy: the ends are within 25 % of the truth once trials · rate · (1 - rate) is above 2,000, within 0.1 %
/// at a thousand million trials.</para>
/// <para>Source: H. Cramér, Actual. Sci. Ind. 736 (1938) 5–23, and R. R. Bahadur and R. Ranga Rao, Ann. Math.
/// Statist. 31 (1960) 1015–1027,
/// for the tilt; its error after I. G. Shevtsova, Inform. Primen. 7 (2013) 124–125. The page gives the proof.</para>
/// </remarks>
public static class TiltedBerryEsseen
{
    // Above the error of an exponent of up to 690 and of Mills' ratio.
    const double Rounding = 1e-11;
    const double RootTwoPi = 2.506628274631000502416;

    /// <summary>The probability of so many successes or more.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="successes">Least number of successes, in [0, <paramref name="trials"/>].</param>
    /// <param name="rate">Probability of a success in one trial, in (0, 1).</param>
    /// <returns>An enclosure of P(S ≥ successes).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure UpperTail(long trials, long successes, double rate)
    {
        Require(trials, successes, rate);
        if (successes == 0)
            return new Enclosure(1, 1);

        return BinomialPoint.MeanExcess(trials, successes, rate) < 0
            ? Beyond(trials, successes, rate)
            : Beyond(trials, successes - 1, rate).Complement();
    }

    /// <summary>The probability of so many successes or fewer.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="successes">Greatest number of successes, in [0, <paramref name="trials"/>].</param>
    /// <param name="rate">Probability of a success in one trial, in (0, 1).</param>
    /// <returns>An enclosure of P(S ≤ successes).</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure LowerTail(long trials, long successes, double rate)
    {
        Require(trials, successes, rate);
        if (successes == trials)
            return new Enclosure(1, 1);

        return BinomialPoint.MeanExcess(trials, successes, rate) > 0
            ? Beyond(trials, successes, rate)
            : Beyond(trials, successes + 1, rate).Complement();
    }

    static void Require(long trials, long successes, double rate)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        Check.AtLeast(successes, 0, nameof(successes));
        Check.AtMost(successes, trials, nameof(successes));
        Check.Inside(rate, 0, 1, nameof(rate));
    }

    // The tail that begins at a count and leads away from the mean, by the law tilted so that its mean is that count.
    static Enclosure Beyond(long trials, long successes, double rate)
    {
        double excess = BinomialPoint.MeanExcess(trials, successes, rate);
        double height = Elementary.Exp(-BinomialPoint.Deviance(trials, successes, rate));
        if (successes == 0 || successes == trials)
            return Enclosure.Widened(height, height, Rounding);

        double failures = trials - successes;
        double tilt = excess < 0
            ? Elementary.LogOnePlus(-excess / (failures * rate))
            : Elementary.LogOnePlus(excess / (successes * (1 - rate)));
        double share = successes / (double)trials;
        var (mills, distance) = Ratio(tilt, trials, share, failures / trials);
        return Enclosure.Widened(
            height * Math.Max(0, mills - distance), height * Math.Min(1, mills + distance), Rounding);
    }

    // e^{t²/2} Q(t) and twice the distance of the tilted sum from its normal approximation.
    static (double Mills, double Distance) Ratio(double tilt, double trials, double share, double other)
    {
        double deviation = Math.Sqrt(share * other);
        double mills = NormalTail.Mills(tilt * deviation * Math.Sqrt(trials)) / RootTwoPi;
        return (mills, 2 * BerryEsseen.Distance((share * share + other * other) / deviation, trials));
    }

    sealed class OfRates : RateTheorem
    {
        public override string Name => "tilted Berry–Esseen";

        public override string Assumes => "independent trials of one rate";

        public override long? TrialsNeeded(RatePlan plan, IReadOnlyList<RateSide> sides) =>
            Greatest(sides, side => TrialsNeeded(side, plan.Miss));

        static long? TrialsNeeded(RateSide side, double miss)
        {
            if (side.Edge is 0 or 1 || side.Defect is 0 or 1 || ChernoffTrials.Ceiling(side, miss) is not { } proven)
                return null;

            return First(0.85 * proven, trials => Suffices(side, miss, trials));
        }

        // Both bounds fall with the trials while the cut stays: one cut that works now works from here on.
        static bool Suffices(RateSide side, double miss, long trials)
        {
            double red = Elementary.Log(side.Risk) - Rounding;
            if (LogBound(trials, side.Defect, side.Edge) > red)
                return false;

            double start = side.Edge + (side.Defect - side.Edge) * 1e-9;
            if (LogBound(trials, start, side.Edge) <= red)
                return false;

            var (lower, upper) = RootBracket.Find(
                cut => LogBound(trials, cut, side.Edge) - red,
                Math.Min(start, side.Defect), Math.Max(start, side.Defect), 1e-12);
            double cut = side.Defect > side.Edge ? upper : lower;
            return LogBound(trials, cut, side.Edge) <= red
                && LogBound(trials, cut, side.Defect) <= Elementary.Log(miss) - Rounding;
        }

        // ln of a bound on P(share beyond the cut) at a rate, valid for every real cut.
        static double LogBound(long trials, double cut, double rate)
        {
            double excess = Math.Abs(cut - rate);
            double tilt = Elementary.LogOnePlus(cut > rate ? excess / ((1 - cut) * rate) : excess / (cut * (1 - rate)));
            var (mills, distance) = Ratio(tilt, trials, cut, 1 - cut);
            return -trials * Divergence.Bernoulli(cut, rate) + Elementary.Log(Math.Min(1, mills + distance));
        }
    }
}
