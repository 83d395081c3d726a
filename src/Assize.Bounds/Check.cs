using System.Globalization;

namespace Assize.Bounds;

/// <summary>Domains, written as what must hold so that NaN is refused.</summary>
static class Check
{
    public static void Between(double value, double lower, double upper, string name)
    {
        if (!(value >= lower && value <= upper))
            throw new ArgumentOutOfRangeException(name, value, $"must lie in [{Text(lower)}, {Text(upper)}].");
    }

    public static void Probability(double value, string name) => Between(value, 0, 1, name);

    public static void Inside(double value, double lower, double upper, string name)
    {
        if (!(value > lower && value < upper))
            throw new ArgumentOutOfRangeException(name, value, $"must lie in ({Text(lower)}, {Text(upper)}).");
    }

    // Below 1e-300 a relative error means nothing.
    public static void Risk(double value, string name)
    {
        if (!(value >= 1e-300 && value < 1))
            throw new ArgumentOutOfRangeException(name, value, "must lie in [1e-300, 1).");
    }

    public static void Finite(double value, string name) => Between(value, double.MinValue, double.MaxValue, name);

    public static void AtLeast(long value, long least, string name)
    {
        if (value < least)
            throw new ArgumentOutOfRangeException(name, value, $"must be at least {least}.");
    }

    public static void AtMost(long value, long most, string name)
    {
        if (value > most)
            throw new ArgumentOutOfRangeException(name, value, $"must be at most {most}.");
    }

    public static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
