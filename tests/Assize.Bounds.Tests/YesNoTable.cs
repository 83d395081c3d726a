using System.Globalization;
using System.Text;

namespace Assize.Bounds.Tests;

/// <summary>The table of a page that sets a bound beside the exact tail of yes/no draws, and perhaps beside another
/// bound.</summary>
static class YesNoTable
{
    public delegate double Bound(long trials, double rate, long successes);

    static readonly (long Trials, double Rate, long Successes)[] Rows =
        [(100, 0.5, 65), (10_000, 0.5, 5_300), (10_000, 0.01, 160), (1_000_000, 0.01, 10_600)];

    public static string Of(Bound bound, string otherName, Bound other)
    {
        var text = new StringBuilder($"| trials | rate | successes | exact | bound | ratio | {otherName} |\n");
        text.Append("| --: | --: | --: | --: | --: | --: | --: |\n");
        foreach (var (trials, rate, successes) in Rows)
        {
            double exact = BinomialTail.UpperTail(trials, successes, rate).Upper;
            double value = bound(trials, rate, successes);
            text.Append(CultureInfo.InvariantCulture, $"| {trials:N0} | {rate} | {successes:N0} | {exact:0.00e+0} ");
            text.Append(CultureInfo.InvariantCulture, $"| {value:0.00e+0} | {value / exact:0.0} ");
            text.Append(CultureInfo.InvariantCulture, $"| {other(trials, rate, successes) / exact:0.0} |\n");
        }

        return text.ToString();
    }

    /// <summary>A bound from the draws' variance and from how far a success lies above the mean.</summary>
    public static Bound ByVariance(Func<long, double, double, double, Enclosure> tail) => (trials, rate, successes) =>
        tail(trials, rate * (1 - rate), 1 - rate, successes / (double)trials - rate).Upper;
}
