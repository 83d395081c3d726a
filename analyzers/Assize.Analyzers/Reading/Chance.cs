using Assize.Bounds;

namespace Assize.Analyzers;

/// <summary>The chance of red of a whole run from that of one evaluation, rounded outwards.</summary>
static class Chance
{
    // Each step below rounds a few times at 1.1e-16; there are at most 64 steps.
    const double Rounding = 1e-13;

    public static Enclosure OfRun(Enclosure once, Runs runs) => new(
        Math.Max(0, Of(once.Lower, runs) * (1 - Slack(runs))),
        Math.Min(1, Of(once.Upper, runs) * (1 + Slack(runs))));

    /// <summary>
    /// The chance one evaluation may have, so that the run has no more than this: for tries a root, for repeats a
    /// share.
    /// </summary>
    public static double OfOneRun(double risk, Runs runs) =>
        runs.Tries > 1 ? Math.Pow(risk, 1.0 / runs.Tries) * (1 - Rounding) : risk / runs.Repeats;

    static double Slack(Runs runs) => runs == Runs.Once ? 0 : Rounding;

    static double Of(double once, Runs runs) => Any(All(once, runs.Tries), runs.Repeats);

    static double All(double once, long times) => Repeated(once, times, 1, (a, b) => a * b);

    // a + (1 − a)·b has no cancellation: relative accuracy survives at any size.
    static double Any(double once, long times) => Repeated(once, times, 0, (a, b) => a + ((1 - a) * b));

    static double Repeated(double once, long times, double none, Func<double, double, double> joined)
    {
        double total = none;
        for (double power = once; times > 0; times >>= 1, power = joined(power, power))
        {
            if ((times & 1) == 1)
                total = joined(total, power);
        }

        return total;
    }
}
