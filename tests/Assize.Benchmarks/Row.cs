using System.Globalization;

namespace Assize.Benchmarks;

/// <summary>One line of the table: what was measured beside its limit.</summary>
/// <param name="Case">What was varied.</param>
/// <param name="Best">From the least time of each side.</param>
/// <param name="Median">The median over pairs.</param>
/// <param name="Limit">What must not be passed; null where the row only informs.</param>
/// <param name="Note">Absolute numbers, for people.</param>
sealed record Row(string Case, double Best, double Median, double? Limit, string Note)
{
    /// <summary>"x" for a ratio, else the unit.</summary>
    public string Unit { get; init; } = "x";

    /// <summary>Whether more is better, so that the limit is the least allowed.</summary>
    public bool IsAtLeast { get; init; }

    /// <summary>Whether the median keeps the limit.</summary>
    public bool IsKept => Limit is not { } limit || (IsAtLeast ? Median >= limit : Median <= limit);

    /// <summary>A ratio of times, with the time of one item on each side.</summary>
    public static Row Of(string name, Comparison pair, double? limit, double items = 1) =>
        new(name, pair.Best, pair.Median, limit, $"{Time(pair.Subject / items)} : {Time(pair.Reference / items)}");

    public static string Time(double seconds) => seconds switch
    {
        < 1e-6 => string.Create(CultureInfo.InvariantCulture, $"{seconds * 1e9:0.0} ns"),
        < 1e-3 => string.Create(CultureInfo.InvariantCulture, $"{seconds * 1e6:0.0} µs"),
        < 1 => string.Create(CultureInfo.InvariantCulture, $"{seconds * 1e3:0.00} ms"),
        _ => string.Create(CultureInfo.InvariantCulture, $"{seconds:0.00} s"),
    };

    public override string ToString() => string.Create(CultureInfo.InvariantCulture,
        $"  {Case,-46} {Best,9:0.000} {Median,9:0.000} {LimitText,9}  {(IsKept ? "" : "OVER"),-4}  {Note}");

    string LimitText => Limit is not { } limit ? ""
        : string.Create(CultureInfo.InvariantCulture, $"{(IsAtLeast ? ">=" : "<=")}{limit:0.###}{Unit}");
}
