using System.Globalization;
using System.Text;
using Assize.Testing;

namespace Assize.Bounds.Tests;

/// <summary>How far a bound lies above its formula, value by value, and the table of its page that says so.</summary>
sealed class AccuracyTable(string theorem, double accuracy)
{
    // Of the logarithm of 1e-300, and of the quotient of two doubles.
    const double Rounding = 2e-13;
    const double Least = -690.7755278982137;

    readonly StringBuilder _text = new("| values | of them | worst error |\n| :-- | --: | --: |\n");

    /// <summary>Probabilities against the logarithms of their formulas, each at most 1 and at least 1e-300.</summary>
    public void Tails(string values, IEnumerable<(double Logarithm, Enclosure Tail)> pairs) => Add(
        values,
        pairs.Select(pair => Elementary.Log(pair.Tail.Upper) - Math.Min(0, Math.Max(Least, pair.Logarithm))));

    public void Margins(string values, IEnumerable<(double Formula, double Margin)> pairs) =>
        Add(values, pairs.Select(pair => (pair.Margin - pair.Formula) / pair.Formula));

    void Add(string values, IEnumerable<double> errors)
    {
        double worst = 0;
        int seen = 0;
        foreach (double error in errors)
        {
            Assert.True(error >= -Rounding && error <= accuracy, $"{error:E2} at value {seen} of: {values}");
            worst = Math.Max(worst, error);
            seen++;
        }

        _text.Append(CultureInfo.InvariantCulture, $"| {values} | {seen} | {worst:0e+0} |\n");
    }

    public void MustStand() => Repository.MustContain($"src/docs/tails/{theorem}.md", "accuracy", _text.ToString());
}
