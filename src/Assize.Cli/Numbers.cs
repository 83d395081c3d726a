using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;

namespace Assize.Cli;

/// <summary>How numbers are read and written: the same on every machine.</summary>
static class Numbers
{
    public static Option<double?> Option(string name, string description) =>
        new(name) { Description = description, CustomParser = Parse, HelpName = "number" };

    /// <summary>An option whose number may be left out.</summary>
    public static Option<double?> Side(string name, string description) =>
        new(name) { Description = description, CustomParser = Parse, HelpName = "number", Arity = ArgumentArity.ZeroOrOne };

    public static string Text(double value) => Math.Abs(value) is > 0 and < 0.001
        ? value.ToString("0.##########e+0", CultureInfo.InvariantCulture)
        : value.ToString("G10", CultureInfo.InvariantCulture);

    public static string Text(long value) => value.ToString("#,0", CultureInfo.InvariantCulture);

    public static string Ratio(double value) =>
        value.ToString(value < 100 ? "0.00" : "#,0", CultureInfo.InvariantCulture);

    /// <summary>A probability that must not look smaller than it is: three digits, rounded up.</summary>
    public static string AtMost(double probability)
    {
        if (probability is 0 or 1)
            return Text(probability);

        int exponent = (int)Math.Floor(Math.Log10(probability));
        double lead = Math.Ceiling(probability / Math.Pow(10, exponent - 2) * (1 - 1e-12));
        return Text(double.Parse(string.Create(CultureInfo.InvariantCulture, $"{lead}e{exponent - 2}"), CultureInfo.InvariantCulture));
    }

    static double? Parse(ArgumentResult result)
    {
        if (result.Tokens.Count == 0)
            return null;

        string text = result.Tokens[0].Value;
        if (double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value))
            return value;

        result.AddError($"'{text}' is not a number. Write it with a decimal point, for example 0.05 or 1e-6.");
        return null;
    }
}
