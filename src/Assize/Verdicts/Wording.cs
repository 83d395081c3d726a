using System.Globalization;
using Assize.Bounds;

namespace Assize;

/// <summary>How numbers and claims are put into words, the same on every machine.</summary>
static class Wording
{
    /// <summary>A number as its author would write it: ten digits tell apart what a claim can.</summary>
    public static string Number(double value) => value.ToString("G10", CultureInfo.InvariantCulture);

    public static string Number(long value) => value.ToString("#,0", CultureInfo.InvariantCulture);

    public static string Plural(long count, string thing) => count == 1 ? $"1 {thing}" : $"{Number(count)} {thing}s";

    /// <summary>What was observed, to as many digits as the number of trials can tell apart.</summary>
    public static string Share(double value, long trials)
    {
        int digits = Math.Clamp((int)Math.Ceiling(Math.Log10(Math.Max(10, trials))), 2, 9);
        return value.ToString("0." + new string('#', digits), CultureInfo.InvariantCulture);
    }

    /// <summary>An interval that contains the given one: its ends are rounded outwards to four significant digits of its width.</summary>
    public static string Interval((double Lower, double Upper) interval)
    {
        double width = interval.Upper - interval.Lower;
        int digits = width > 0 ? Math.Clamp(2 - (int)Math.Floor(Math.Log10(width)), 1, 15) : 15;
        double unit = Math.Pow(10, digits);
        double lower = Math.Max(Math.Floor(interval.Lower * unit) / unit, 0);
        double upper = Math.Min(Math.Ceiling(interval.Upper * unit) / unit, 1);
        string format = "0." + new string('#', digits);
        return $"{lower.ToString(format, CultureInfo.InvariantCulture)} to {upper.ToString(format, CultureInfo.InvariantCulture)}";
    }

    /// <summary>Evidence as odds, rounded down: "1,000 to 1", "3.2e11 to 1", "beyond all odds".</summary>
    public static string Odds(double log)
    {
        if (double.IsPositiveInfinity(log))
            return "beyond all odds";

        double power = Math.Floor(log / Math.Log(10));
        if (log < 0)
            return "less than 1 to 1";
        if (power < 6)
            return $"{Number((long)Math.Floor(Math.Exp(log) * (1 - 1e-9)))} to 1";

        double lead = Math.Floor(Math.Exp(log - power * Math.Log(10)) * 10 * (1 - 1e-9)) / 10;
        return string.Create(CultureInfo.InvariantCulture, $"{Math.Max(1, lead)}e{power} to 1");
    }

    /// <summary>How seldom something happens, rounded to the frequent side: "1 run in 1,000,000,000".</summary>
    public static string OnceIn(double probability)
    {
        double times = Math.Floor(1 / probability * (1 + 1e-12));
        return times < 9e15 ? $"1 run in {Number((long)times)}" : string.Create(CultureInfo.InvariantCulture, $"1 run in {times:0.#e+0}");
    }

    /// <summary>What a claim says of its quantity.</summary>
    public static string Target(Edges edges, double target, double tolerance, double defect)
    {
        bool below = edges.LowerEdge is not null, above = edges.UpperEdge is not null;
        string range = (below, above) switch
        {
            (true, false) when tolerance == 0 && edges.UpperDefect is null && target < 1 => $"{Number(target)} or more",
            (false, true) when tolerance == 0 && edges.LowerDefect is null && target > 0 => $"{Number(target)} or less",
            _ => tolerance == 0 ? Number(target) : $"{Number(target)} give or take {Number(tolerance)}",
        };
        string caught = string.Join(" and ", new[]
        {
            edges.LowerDefect is { } low ? $"from {Number(low)} down" : null,
            edges.UpperDefect is { } high ? $"from {Number(high)} up" : null,
        }.Where(text => text is not null));
        return defect == 2 * tolerance ? range : $"{range} (caught {caught})";
    }
}
