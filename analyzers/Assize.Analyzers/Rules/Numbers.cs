using System.Globalization;

namespace Assize.Analyzers;

/// <summary>Numbers as messages print them: invariant, and rounded to the side that keeps the sentence true.</summary>
static class Numbers
{
    // From here on three digits and a power of ten are easier to read.
    const double MostWhole = 1e15;

    public static string Count(long count) => count.ToString("N0", CultureInfo.InvariantCulture);

    /// <summary>
    /// The N of "in at least 1 of N runs": rounded up, so that the sentence promises no more than the probability.
    /// </summary>
    public static string RunsForAtLeast(double probability) => Whole(1 / probability, Math.Ceiling);

    /// <summary>The N of "in at most 1 of N runs": rounded down.</summary>
    public static string RunsForAtMost(double probability) => Whole(1 / probability, Math.Floor);

    /// <summary>A rate or a distance to four significant digits.</summary>
    public static string Share(double share) => share.ToString("G4", CultureInfo.InvariantCulture);

    /// <summary>
    /// A rate rounded to four digits away from another one, so that what is said to be caught is caught.
    /// </summary>
    public static string ShareAwayFrom(double share, double origin) =>
        Share(Math.Min(1, Math.Max(0, RoundedAwayFrom(share, origin))));

    /// <summary>The same for a value that need not be a rate.</summary>
    public static string AwayFrom(double value, double origin) => Share(RoundedAwayFrom(value, origin));

    /// <summary>A number rounded down to two significant digits.</summary>
    public static string ShareBelow(double share)
    {
        double unit = Math.Pow(10, Math.Floor(Math.Log10(share)) - 1);
        return (Math.Floor(share / unit) * unit).ToString("G2", CultureInfo.InvariantCulture);
    }

    static double RoundedAwayFrom(double value, double origin)
    {
        double unit = Math.Pow(10, Math.Floor(Math.Log10(Math.Max(Math.Abs(value), 1e-12))) - 3);
        return value > origin ? Math.Ceiling(value / unit) * unit : Math.Floor(value / unit) * unit;
    }

    static string Whole(double runs, Func<double, double> round)
    {
        double whole = Math.Min(double.MaxValue, Math.Max(1, round(runs)));
        if (whole < MostWhole)
            return ((long)whole).ToString("N0", CultureInfo.InvariantCulture);
        double exponent = Math.Floor(Math.Log10(whole));
        double digits = round(whole / Math.Pow(10, exponent - 2));
        return ((long)digits).ToString(CultureInfo.InvariantCulture) + "e" + (exponent - 2).ToString(
            CultureInfo.InvariantCulture);
    }
}
