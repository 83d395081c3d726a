using System.Globalization;
using System.Text;

namespace Assize.Bounds.Tests;

/// <summary>Yes/no draws for a bound: by chance, and the table of a page that sets it beside the exact tail and another
/// bound.</summary>
static class YesNoDraws
{
    public delegate double Bound(long trials, double rate, long successes);

    static readonly (long Trials, double Rate, long Successes)[] Rows =
        [(100, 0.5, 65), (10_000, 0.5, 5_300), (10_000, 0.01, 160), (1_000_000, 0.01, 10_600)];

    public static string Table(Bound bound, string otherName, Bound other)
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

    /// <summary>Numbers of successes by chance, up to 30 deviations from their mean, trials and rates of every
    /// size.</summary>
    public static IEnumerable<(long Trials, double Rate, long Successes)> ByChance(int seed, int number)
    {
        var random = new Random(seed);
        for (int i = 0; i < number; i++)
        {
            long trials = (long)Math.Pow(10, 9 * Math.Pow(random.NextDouble(), 2));
            double rate = Math.Min(0.5, Math.Pow(10, -9 * random.NextDouble()));
            rate = random.Next(2) == 0 ? rate : 1 - rate;
            double deviation = Math.Sqrt(trials * rate * (1 - rate)) + 0.5;
            double successes = trials * rate + 30 * Math.Pow(2 * random.NextDouble() - 1, 3) * deviation;
            yield return (trials, rate, (long)Math.Round(Math.Max(0, Math.Min(trials, successes))));
        }
    }

    /// <summary>A bound from the draws' variance and from how far a success lies above the mean.</summary>
    public static Bound ByVariance(Func<long, double, double, double, Enclosure> tail) => (trials, rate, successes) =>
        tail(trials, rate * (1 - rate), 1 - rate, successes / (double)trials - rate).Upper;
}
