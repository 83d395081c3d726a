using System.Globalization;
using Assize.Bounds;

namespace Assize;

/// <summary>How numbers and claims are put into words, the same on every machine.</summary>
static class Wording
{
    static readonly CultureInfo Culture = CultureInfo.InvariantCulture;

    /// <summary>A number as its author would write it: ten digits tell apart what a claim can.</summary>
    public static string Number(double value) => value.ToString("G10", Culture);

    /// <summary>A number to the last digit, for refusing it.</summary>
    public static string Exact(double value) => value.ToString("R", Culture);

    public static string Number(long value) => value.ToString("#,0", Culture);

    /// <summary>A whole number as C# reads it: 1_000_000.</summary>
    public static string Literal(long value) => Number(value).Replace(',', '_');

    public static string Trials(long count) => count == 1 ? "1 trial" : $"{Number(count)} trials";

    /// <summary>What was observed, to as many digits as the number of trials can tell apart.</summary>
    public static string Share(double value, long trials)
    {
        int digits = Math.Clamp((int)Math.Ceiling(Math.Log10(Math.Max(10, trials))), 2, 9);
        return value.ToString("0." + new string('#', digits), Culture);
    }

    /// <summary>A share with its count: "0.75 (7,500 of 10,000)".</summary>
    public static string Count(long successes, long trials) =>
        $"{Share((double)successes / trials, trials)} ({Number(successes)} of {Number(trials)})";

    /// <summary>The counts that uphold a claim: "7,400 to 7,600 successes".</summary>
    public static string Counts(RateLimits limits) =>
        $"{Number(limits.AcceptLow)} to {Number(limits.AcceptHigh)} successes";

    /// <summary>A value to the digits that an interval around it can tell apart.</summary>
    public static string Value(double value, (double Lower, double Upper) interval)
    {
        double width = interval.Upper - interval.Lower;
        return width > 0 && width < double.MaxValue
            ? Plain(value, Digits(width))
            : value.ToString("G6", Culture);
    }

    /// <summary>An interval that contains the given one: its ends are rounded outwards to three digits of its
    /// width.</summary>
    public static string Interval((double Lower, double Upper) interval, Domain? domain)
    {
        double width = interval.Upper - interval.Lower;
        int digits = Digits(width);
        double unit = Math.Pow(10, digits);
        string End(double end, double limit, Func<double, double> outwards) =>
            !double.IsFinite(end) ? (limit < 0 ? "-∞" : "∞")
            : Math.Abs(end * unit) < 1e15 ? Plain(Clamped(outwards(end * unit) / unit, domain), digits)
            : Exact(end);
        return $"{End(interval.Lower, double.NegativeInfinity, Math.Floor)} to "
            + $"{End(interval.Upper, double.PositiveInfinity, Math.Ceiling)}";
    }

    static double Clamped(double value, Domain? domain) =>
        domain is null ? value : Math.Clamp(value, domain.Minimum, domain.Maximum);

    static int Digits(double width) =>
        width > 0 ? Math.Clamp(2 - (int)Math.Floor(Math.Log10(width)), 0, 15) : 15;

    static string Plain(double value, int digits) =>
        value.ToString(digits == 0 ? "#,0" : "#,0." + new string('#', digits), Culture);

    /// <summary>Evidence as odds, rounded down: "1,000 to 1", "3.2e11 to 1", "certain".</summary>
    public static string Odds(double log)
    {
        if (double.IsPositiveInfinity(log))
            return "certain";
        if (!(log >= 0))
            return "less than 1 to 1";

        // Less than the rounding of the exponential, so that odds are never overstated.
        const double shortening = 1 - 1e-9;
        double power = Math.Floor(log / Math.Log(10));
        if (power < 6)
            return $"{Number(Math.Max(1, (long)Math.Floor(Math.Exp(log) * shortening)))} to 1";

        double lead = Math.Floor(Math.Exp(log - power * Math.Log(10)) * 10 * shortening) / 10;
        return lead < 1
            ? string.Create(Culture, $"9.9e{power - 1} to 1")
            : string.Create(Culture, $"{lead}e{power} to 1");
    }

    /// <summary>How seldom something happens, rounded to the frequent side: "1 run in 1,000,000,000".</summary>
    public static string OnceIn(double probability)
    {
        double runs = Math.Floor(1 / probability * (1 + 1e-12));
        return runs < 1e15
            ? $"1 run in {Number((long)runs)}"
            : string.Create(Culture, $"1 run in {Math.Floor(runs / Math.Pow(10, Math.Floor(Math.Log10(runs))))}e{Math.Floor(Math.Log10(runs))}");
    }

    /// <summary>What is claimed of a rate, and what must be caught, in one sentence without a full stop.</summary>
    public static string Rate(Edges edges, double tolerance)
    {
        if (!ZeroFailures.Applies(edges))
            return Claimed("rate", edges, tolerance);

        return $"it {(edges.Target == 0 ? "never" : "always")} happens {Caught(edges)}";
    }

    /// <summary>What is claimed of a quantity, and what must be caught: "the mean is 3.5, give or take 0.05 (caught from
    /// 3.4 down and from 3.6 up)".</summary>
    public static string Claimed(string quantity, Edges edges, double tolerance)
    {
        string target = Number(edges.Target);
        bool isTwoSided = edges is { LowerEdge: not null, UpperEdge: not null };
        string claimed = tolerance > 0 ? $"{target}, give or take {Number(tolerance)}"
            : isTwoSided ? $"exactly {target}"
            : $"{target} {(edges.UpperEdge is null ? "or more" : "or less")}";
        return $"the {quantity} is {claimed} {Caught(edges)}";
    }

    /// <summary>What is vouched for about a draw: "draws between 0 and 1 and of standard deviation up to 0.1".</summary>
    public static string Facts(MeanFacts facts)
    {
        var parts = new List<string>();
        if (facts is { Minimum: { } lower, Maximum: { } upper })
            parts.Add($"between {Number(lower)} and {Number(upper)}");
        if (facts.SecondMoment is { } square)
            parts.Add($"of 0 or more and with a mean square up to {Number(square)}");
        else if (facts.Proxy is { } proxy)
            parts.Add($"sub-Gaussian of proxy {Number(proxy)}");
        else if (facts.StandardDeviation is { } deviation)
            parts.Add($"of standard deviation up to {Number(deviation)}");
        return $"draws {string.Join(" and ", parts)}";
    }

    /// <summary>Which values must be caught: "(caught from 3.4 down and from 3.6 up)".</summary>
    public static string Caught(Edges edges)
    {
        string[] defects =
        [
            .. edges.LowerDefect is { } low ? [$"from {Number(low)} down"] : Array.Empty<string>(),
            .. edges.UpperDefect is { } high ? [$"from {Number(high)} up"] : Array.Empty<string>(),
        ];
        return $"(caught {string.Join(" and ", defects)})";
    }
}
