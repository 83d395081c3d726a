using Assize.Bounds;

namespace Assize;

/// <summary>What counts of many outputs say when trials stop.</summary>
static class ManyRatesReport
{
    const int MostRows = 5;
    const int MostCounts = 1_000;

    public static RaceReport Of(
        ManyStakes stakes, long[] counts, long trials, string theorem, long cap, IReadOnlyList<(long Low, long High)>? limits)
    {
        var sides = new RateSides(stakes, counts, trials);
        int? farthest = trials == 0 ? null : sides.FarthestOff().First();
        return new RaceReport
        {
            Trials = trials,
            Observed = double.NaN,
            Seen = farthest is not { } output ? null : $"output {output} {Wording.Count(counts[output], trials)} where "
                + $"{Wording.Number(stakes.Plan.Rates[output].Target)} is claimed, the farthest off of {Wording.Number((long)counts.Length)}",
            Interval = (double.NaN, double.NaN),
            LogEvidenceAgainstClaim = sides.AgainstAverage(),
            LogEvidenceAgainstDefectBelow = sides.AgainstDefectBelow(),
            LogEvidenceAgainstDefectAbove = sides.AgainstDefectAbove(),
            Miss = stakes.Plan.Miss,
            Theorem = theorem,
            Cap = cap,
            Accepts = limits is null ? null : "counts within the limits of every output",
            Details = trials == 0 ? [] : [.. Rows(stakes, counts, trials, sides, limits)],
            Counts = counts.Length > MostCounts ? null
                : Enumerable.Range(0, counts.Length).ToDictionary(cell => $"{cell}", cell => (double)counts[cell]),
        };
    }

    /// <summary>The outputs whose counts are not within their limits.</summary>
    public static IEnumerable<int> Outside(ManyStakes stakes, long[] counts, IReadOnlyList<(long Low, long High)> limits) =>
        Enumerable.Range(0, counts.Length).Where(output =>
            counts[output] < limits[stakes.Plan.KindOf[output]].Low || counts[output] > limits[stakes.Plan.KindOf[output]].High);

    static IEnumerable<(string Label, string Content)> Rows(
        ManyStakes stakes, long[] counts, long trials, RateSides sides, IReadOnlyList<(long Low, long High)>? limits)
    {
        var named = limits is not null
            ? [.. Outside(stakes, counts, limits)]
            : ClosedTesting.Refuted([.. Enumerable.Range(0, counts.Length)
                .Select(output => Elementary.Exp(Math.Min(600, sides.AgainstClaim(output) - stakes.LogRed)))]);
        foreach (int output in named.Take(MostRows))
            yield return ("refuted", $"output {output}: {Wording.Count(counts[output], trials)}; evidence against it alone {Wording.Odds(sides.AgainstClaim(output))}");
        if (named.Count == 0 && limits is null && sides.AgainstAverage() >= stakes.LogRed - 1e-6)
            yield return ("refuted", "the outputs together; none of them alone can be named at the same risk");
        if (named.Count > MostRows)
            yield return ("", $"and {Wording.Number((long)named.Count - MostRows)} more outputs, all at one risk");
    }
}
