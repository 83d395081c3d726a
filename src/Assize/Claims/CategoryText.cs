using System.Globalization;

namespace Assize;

/// <summary>How categories are put into words, the same on every machine.</summary>
static class CategoryText
{
    const int Longest = 60;

    /// <summary>A category as its author would write it; a string in quotes.</summary>
    public static string Of(object? category)
    {
        string text = category switch
        {
            null => "null",
            string words => $"\"{words}\"",
            char letter => $"'{letter}'",
            IFormattable number => number.ToString(null, CultureInfo.InvariantCulture),
            _ => category.ToString() ?? "",
        };
        string line = string.Join(' ', text.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
        return line.Length <= Longest ? line : line[..(Longest - 1)] + "…";
    }

    /// <summary>What is claimed of shares, in one sentence without a full stop.</summary>
    public static string Claimed(
        IReadOnlyList<(string Name, double Share)> first, int count, double? equal, double tolerance, double defect)
    {
        string limits = $"{(tolerance == 0 ? "exactly" : $"give or take {Wording.Number(tolerance)}")} (caught from {Wording.Number(defect)} away)";
        if (equal is { } share)
            return $"each of {Wording.Number((long)count)} categories has a share of {Wording.Number(share)}, {limits}";

        string more = count > first.Count ? $" and {Wording.Number((long)count - first.Count)} more" : "";
        return $"the shares are {string.Join(", ", first.Select(category => $"{category.Name} {Wording.Number(category.Share)}"))}{more}, {limits}";
    }
}
