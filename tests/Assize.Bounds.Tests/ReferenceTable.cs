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
