using System.Globalization;

namespace Assize.Bounds;

/// <summary>Arithmetic on the decimals a person wrote, not on the doubles nearest to them.</summary>
static class Decimals
{
    /// <summary>1 - value in decimal, for a value in (0, 1); never rounded to 1.</summary>
    public static double Complement(double value) =>
        Exact(value) is { } exact ? Nearest(1 - exact) : Math.Min(1 - value, 1 - 1.2e-16);

    /// <summary>The shortest decimal that reads back as this double; null where a decimal would lose digits that the
    /// double has.</summary>
    public static decimal? Exact(double value) =>
        value == 0 || (Math.Abs(value) > 1e-10 && Math.Abs(value) < 1e12)
            ? decimal.Parse(Check.Text(value), NumberStyles.Float, CultureInfo.InvariantCulture)
            : null;

    // A cast from decimal may be off by one unit in the last place; parsing is not.
    public static double Nearest(decimal value) =>
        double.Parse(value.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
