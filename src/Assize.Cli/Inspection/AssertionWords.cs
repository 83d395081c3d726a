using System.Globalization;

namespace Assize.Cli;

/// <summary>The numbers of an assertion in the words that both reports for people use.</summary>
static class AssertionWords
{
    public static string FalseFailure(InspectedAssertion assertion) => assertion switch
    {
        { IsPinned: true } => "same draws every run",
        { FalseFailure: null } => "not bounded",
        { FalseFailure: { Lower: > 0 } chance } when IsNarrow(chance.Lower, chance.Upper) => $"1 in {Runs(chance.Upper)}",
        { FalseFailure: { } chance } => $"at most 1 in {Runs(chance.Upper)}",
    };

    public static string Catches(InspectedAssertion assertion) => assertion.SmallestDefectCaught is { } defect
        ? (defect > 0 ? "+" : "") + defect.ToString("G3", CultureInfo.InvariantCulture)
        : "none surely";

    public static string Trials(long? trials) => trials is { } count ? Numbers.Text(count) : "?";

    /// <summary>The one thing to do.</summary>
    public static string Todo(InspectedAssertion assertion) => assertion switch
    {
        { FalseFailure: null } or { IsPinned: true } => "",
        { TrialsNeeded: { } needed, Trials: { } trials } when needed > trials => $"raise to {Numbers.Text(needed)} trials",
        { TrialsNeeded: null } when assertion.Findings.Any(finding => finding.Stands) => "widen the band",
        _ => "",
    };

    public static string Totals(Inspected inspected)
    {
        string bounded = $"{Numbers.Text(inspected.Assertions.Count)} randomized assertions read, {Numbers.Text(inspected.Assessed)} assessed: "
            + $"{Numbers.Text(inspected.Flaky)} flaky, {Numbers.Text(inspected.Toothless)} blind";
        return inspected.Pinned > 0 ? bounded + $", {Numbers.Text(inspected.Pinned)} on a fixed seed" : bounded;
    }

    public static string Sum(Inspected inspected)
    {
        string sum = $"a healthy suite is falsely red in one run with probability at most {Numbers.AtMost(inspected.FalseFailureUpper)} "
            + "by its hand-written assertions";
        if (inspected.Budget is { } allowed)
            sum += $"; {Numbers.Text(allowed)} is allowed";
        return inspected.Unbounded > 0 ? sum + $"; {Numbers.Text(inspected.Unbounded)} more are bounded by nothing and not in it" : sum;
    }

    static bool IsNarrow(double lower, double upper) => lower * 1.01 >= upper;

    // Rounded down: red at most once in so many runs, and never said to be rarer.
    static string Runs(double probability)
    {
        double runs = Math.Floor(1 / probability);
        return runs < 1e9 ? runs.ToString("#,0", CultureInfo.InvariantCulture)
            : runs < double.PositiveInfinity ? runs.ToString("0.0e0", CultureInfo.InvariantCulture) : "1e300";
    }
}
