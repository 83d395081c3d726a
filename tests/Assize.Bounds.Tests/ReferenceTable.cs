using System.Globalization;

namespace Assize.Bounds.Tests;

/// <summary>A table of Reference/: values computed by other programs, see its first lines.</summary>
static class ReferenceTable
{
    public static IEnumerable<Row> Rows(string name)
    {
        string path = Path.Combine(AppContext.BaseDirectory, "Reference", $"{name}.csv");
        string[] lines = [.. File.ReadLines(path).Where(line => line[0] != '#')];
        string[] header = lines[0].Split(',');
        return lines.Skip(1).Select(line => new Row([.. header.Zip(line.Split(','))]));
    }

    /// <summary>How far a computed value is from the true one, relative to it.</summary>
    public static double RelativeError(double computed, double truth) =>
        computed == truth ? 0 : Math.Abs(computed - truth) / Math.Abs(truth);

    /// <summary>How far the logarithm of a probability is from the true one, in the relative error of the
    /// probability.</summary>
    /// <remarks>Near 1 the logarithm itself must be accurate; below 1e-300 each further factor of 1e-300 may cost as
    /// much again.</remarks>
    public static double LogError(double computed, double truth) => computed == truth
        ? 0
        : Math.Abs(computed - truth) / Math.Max(Math.Min(1, Math.Abs(truth)), Math.Abs(truth) / 690);

    /// <summary>The rows of a table whose error is not within what is allowed, with the worst of all; empty if there is
    /// none.</summary>
    public static string Misses(string name, double allowed, int expectedRows, Func<Row, double> error)
    {
        var rows = Rows(name).Select(row => (Row: row, Error: error(row))).ToArray();
        Assert.Equal(expectedRows, rows.Length);
        var missed = rows.Where(row => !(row.Error <= allowed)).OrderByDescending(row => row.Error).ToArray();
        return string.Concat(missed.Select(row => $"{row.Error:E2} at {row.Row}\n"));
    }

    public sealed class Row((string Name, string Text)[] cells)
    {
        public string Text(string column) => cells.Single(cell => cell.Name == column).Text;

        public bool Has(string column) => Text(column).Length > 0;

        public double Number(string column) => Text(column) switch
        {
            "Infinity" => double.PositiveInfinity,
            "-Infinity" => double.NegativeInfinity,
            var text => double.Parse(text, CultureInfo.InvariantCulture),
        };

        public long Whole(string column) => long.Parse(Text(column), CultureInfo.InvariantCulture);

        public decimal Decimal(string column) =>
            decimal.Parse(Text(column), NumberStyles.Float, CultureInfo.InvariantCulture);

        public override string ToString() => string.Join(
            ", ", cells.Take(5).Select(cell => $"{cell.Name} {cell.Text}"));
    }
}
