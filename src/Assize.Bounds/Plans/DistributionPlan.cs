namespace Assize.Bounds;

/// <summary>At which numbers of trials a distance between distributions is looked at, and what decides there.</summary>
/// <remarks>
/// The distance is the greatest difference of two cumulative distributions. Looks grow by a fifth; the risk and the miss are
/// each shared evenly among them (union bound). Red, one source: the empirical distribution strays by more than its margin
/// with probability 2·exp(-2·n·margin²) at most (P. Massart, Ann. Probab. 18 (1990) 1269). Green: were the truth at the
/// defect, at one point the empirical distribution would have to stray towards what is claimed: W. Hoeffding's one-sided
/// exp(-2·n·margin²). Two sources within a tolerance: 4·exp(-n·margin²/2), each by itself; two that are claimed to be the
/// same, from 458 trials on: 2·exp(-n·margin²) (F. Wei and R. M. Dudley, arXiv:1107.5356); green exp(-n·margin²).
/// </remarks>
public sealed class DistributionPlan
{
    /// <summary>No plan is made beyond this many trials, all of whose draws are kept: 1e8.</summary>
    public const long MaximumTrials = 100_000_000;

    const double Ratio = 1.2;
    const int MostLooks = 400;
    const long LeastOfSame = 458;

    // Above the rounding of a distance and of its margins.
    const double Rounding = 1e-12;

    readonly bool _isPair;
    readonly double _redOdds;
    readonly double _greenOdds;

    DistributionPlan(double tolerance, double defect, double risk, double confidence, bool isPair, long? exactly)
    {
        (Tolerance, Defect, Risk, Confidence, _isPair) = (tolerance, defect, risk, confidence, isPair);
        Miss = Decimals.Complement(confidence);
        FixedTrials = Needed(1);
        if (exactly is { } trials)
            Looks = [trials];
        else
            Looks = Schedule();
        (_redOdds, _greenOdds) = (RedOdds(Looks.Count), GreenOdds(Looks.Count));
    }

    /// <summary>The plan for one source that follows a known distribution.</summary>
    /// <param name="tolerance">The greatest distance that is still right, in [0, 1).</param>
    /// <param name="defect">The distance that must be caught, in (tolerance, 1].</param>
    /// <param name="risk">The probability of a false failure allowed, in [1e-300, 1).</param>
    /// <param name="confidence">One minus the probability of a missed defect allowed, in (0, 1), above the risk.</param>
    /// <returns>A plan whose last look always decides.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or more than 1e8 draws would have to be
    /// kept.</exception>
    public static DistributionPlan For(double tolerance, double defect, double risk, double confidence) =>
        Checked(tolerance, defect, risk, confidence, isPair: false);

    /// <summary>The plan for two independent sources that follow the same distribution.</summary>
    /// <param name="tolerance">The greatest distance that is still right, in [0, 1).</param>
    /// <param name="defect">The distance that must be caught, in (tolerance, 1].</param>
    /// <param name="risk">The probability of a false failure allowed, in [1e-300, 1).</param>
    /// <param name="confidence">One minus the probability of a missed defect allowed, in (0, 1), above the risk.</param>
    /// <returns>A plan whose last look always decides; a trial draws once from each source.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, or more than 1e8 draws would have to be
    /// kept.</exception>
    public static DistributionPlan ForPair(double tolerance, double defect, double risk, double confidence) =>
        Checked(tolerance, defect, risk, confidence, isPair: true);

    /// <summary>The same claim with one look only.</summary>
    /// <param name="trials">The number of trials, at least <see cref="FixedTrials"/>.</param>
    /// <returns>A plan with this look.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The number of trials lies outside its domain.</exception>
    public DistributionPlan Once(long trials)
    {
        Check.AtLeast(trials, FixedTrials, nameof(trials));
        Check.AtMost(trials, MaximumTrials, nameof(trials));
        return new DistributionPlan(Tolerance, Defect, Risk, Confidence, _isPair, trials);
    }

    /// <summary>The greatest distance that is still right.</summary>
    public double Tolerance { get; }

    /// <summary>The distance that is caught.</summary>
    public double Defect { get; }

    /// <summary>The probability of a false failure allowed, in [1e-300, 1).</summary>
    public double Risk { get; }

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1).</summary>
    public double Confidence { get; }

    /// <summary>1 - <see cref="Confidence"/>, taken in decimal.</summary>
    public double Miss { get; }

    /// <summary>The numbers of trials at which the distance is looked at, increasing; at the last one it is
    /// decided.</summary>
    public IReadOnlyList<long> Looks { get; }

    /// <summary>The trials that one look alone needs.</summary>
    public long FixedTrials { get; }

    /// <summary>The theorem that decides.</summary>
    public string Theorem => !_isPair ? "Dvoretzky–Kiefer–Wolfowitz–Massart, Hoeffding"
        : Tolerance == 0 ? "Wei–Dudley, Hoeffding"
        : "Dvoretzky–Kiefer–Wolfowitz–Massart on each source, Hoeffding";

    /// <summary>Whether a distance at a look is farther than the tolerance allows.</summary>
    /// <param name="trials">One of the <see cref="Looks"/>.</param>
    /// <param name="distance">The distance seen, in [0, 1].</param>
    /// <returns>True with probability <see cref="Risk"/> at most over all looks, were the claim right.</returns>
    public bool Refutes(long trials, double distance) => distance - Rounding > Tolerance + Margin(_redOdds * RedShare, trials);

    /// <summary>Whether a distance at a look rules the defect out.</summary>
    /// <param name="trials">One of the <see cref="Looks"/>.</param>
    /// <param name="distance">The distance seen, in [0, 1].</param>
    /// <returns>True with probability <see cref="Miss"/> at most over all looks, were there a defect; surely true at the
    /// last look unless it is refuted.</returns>
    public bool Upholds(long trials, double distance) =>
        trials >= Looks[Looks.Count - 1] || distance + Rounding <= Defect - Margin(_greenOdds * GreenShare, trials);

    /// <summary>How far the true distance may be from the one seen, at every look at once.</summary>
    /// <param name="trials">One of the <see cref="Looks"/>.</param>
    /// <returns>A margin exceeded at any of them with probability <see cref="Miss"/> at most.</returns>
    public double Margin(long trials) =>
        Rounding + Margin((Elementary.Log((_isPair ? 4.0 : 2.0) * Looks.Count) - Elementary.Log(Miss)) * (_isPair ? 2 : 0.5), trials);

    /// <summary>The logarithm of the chance, over all looks, of so great a distance if the claim is right.</summary>
    /// <param name="trials">One of the <see cref="Looks"/>.</param>
    /// <param name="distance">The distance seen, in [0, 1].</param>
    /// <returns>A bound, in [-∞, 0].</returns>
    public double LogChanceIfRight(long trials, double distance) =>
        LogChance(distance - Tolerance, RedShare, _redOdds + Elementary.Log(Risk), trials);

    /// <summary>The logarithm of the chance, over all looks, of so small a distance if there is a defect.</summary>
    /// <param name="trials">One of the <see cref="Looks"/>.</param>
    /// <param name="distance">The distance seen, in [0, 1].</param>
    /// <returns>A bound, in [-∞, 0].</returns>
    public double LogChanceIfDefect(long trials, double distance) =>
        LogChance(Defect - distance, GreenShare, _greenOdds + Elementary.Log(Miss), trials);

    static DistributionPlan Checked(double tolerance, double defect, double risk, double confidence, bool isPair)
    {
        Demand.RiskAndConfidence(risk, confidence);
        var edges = Edges.Around(Domain.Rate, 0, tolerance, defect);
        return new DistributionPlan(tolerance, edges.UpperDefect!.Value, risk, confidence, isPair, null);
    }

    static double LogChance(double beyond, double share, double logFactor, long trials) => beyond - Rounding <= 0
        ? 0
        : Math.Min(0, logFactor - (beyond - Rounding) * (beyond - Rounding) * trials / share * (1 - Rounding));

    static double Margin(double odds, long trials) => Math.Sqrt(odds / trials) * (1 + Rounding);

    // margin = √(odds · share / trials).
    double RedShare => !_isPair ? 0.5 : Tolerance == 0 ? 1 : 2;

    double GreenShare => _isPair ? 1 : 0.5;

    double RedOdds(int looks) => Elementary.Log((_isPair && Tolerance > 0 ? 4.0 : 2.0) * looks) - Elementary.Log(Risk);

    double GreenOdds(int looks) => Elementary.Log(looks) - Elementary.Log(Miss);

    long Least => _isPair && Tolerance == 0 ? LeastOfSame : 1;

    long Needed(int looks)
    {
        double red = RedOdds(looks) * RedShare, green = GreenOdds(looks) * GreenShare;
        double root = (Math.Sqrt(red) + Math.Sqrt(green)) / (Defect - Tolerance);
        double trials = root * root;
        if (!(trials <= MaximumTrials))
            throw new ClaimRefusedException($"This claim would keep {trials.ToString("#,0", System.Globalization.CultureInfo.InvariantCulture)} draws, "
                + "more than 100,000,000. Choose a larger defect, or claim quantiles.");

        return IntegerSearch.First(Least, 2 * MaximumTrials, (long)trials, n =>
            Tolerance + Margin(red, n) + 2 * Rounding <= Defect - Margin(green, n) - 2 * Rounding);
    }

    // The first look comes where twice the defect would stand out; more looks cost odds, and odds move the last look.
    IReadOnlyList<long> Schedule()
    {
        for (int looks = 1; looks <= MostLooks; looks++)
        {
            long last = Needed(looks);
            double first = RedOdds(looks) * RedShare / ((2 * Defect - Tolerance) * (2 * Defect - Tolerance));
            var sizes = Backwards(last, looks);
            if (sizes[0] <= Math.Max(first, Least) || looks == MostLooks)
                return [.. sizes.Select(trials => (long)Math.Ceiling(trials)).Where(trials => trials >= Least).Distinct()];
        }

        throw new InvalidOperationException($"No schedule of looks for {Check.Text(Tolerance)} and {Check.Text(Defect)}.");
    }

    static double[] Backwards(long last, int looks)
    {
        double[] sizes = new double[looks];
        double trials = last;
        for (int look = looks - 1; look >= 0; look--, trials /= Ratio)
            sizes[look] = trials;
        return sizes;
    }
}
