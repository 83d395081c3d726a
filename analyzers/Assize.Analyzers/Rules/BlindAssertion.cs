using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A hand-written assertion can never fail, or lets defects pass that are many times its tolerance.</summary>
sealed class BlindAssertion : Rule
{
    public const string Id = "ASZ2003";

    // Below this many tolerances a defect is near what the author asked for.
    const double ManyTimes = 4;

    static readonly DiagnosticDescriptor Blind = Describe(
        id: Id,
        severity: DiagnosticSeverity.Warning,
        title: "Assertion can miss a large defect",
        message: "{0} ({1}); {2}");

    public BlindAssertion() : base(Blind)
    {
    }

    public override Diagnostic? Judge(Reading reading, Limits limits)
    {
        if (reading is not AssertionReading assertion || assertion.Tolerance <= 0)
            return null;
        double? affordable = assertion.ToleranceAffordable(limits.Risk);
        return What(assertion, affordable, limits) is { } what
            ? Report(reading, null, what, AssertionText.Asks(assertion), Cure(assertion, affordable, limits))
            : null;
    }

    static string? What(AssertionReading assertion, double? affordable, Limits limits)
    {
        if (assertion.CannotFail)
            return $"Cannot fail: every {(assertion.Statistic == Statistic.Proportion ? "count" : "draw")} passes";
        if (assertion.DefectCaught(limits.Confidence) is not { } defect)
            return assertion.Statistic == Statistic.Proportion
                ? $"Catches no wrong rate with probability {Numbers.Share(limits.Confidence)}" : null;
        string nearly = $"Can miss a {AssertionText.Unit(assertion)} of nearly {Numbers.Share(assertion.Target + defect ?? defect)}";
        if (Math.Abs(defect) > ManyTimes * assertion.Tolerance)
            return $"{nearly}, {Times(Math.Abs(defect) / assertion.Tolerance)} times the tolerance away";
        return affordable is { } narrow && assertion.Tolerance > ManyTimes * narrow
            ? $"{nearly}: the band is {Times(assertion.Tolerance / narrow)} times as wide as the trials afford"
            : null;
    }

    static string Cure(AssertionReading assertion, double? affordable, Limits limits) =>
        affordable is { } narrow && narrow < assertion.Tolerance
            ? $"{Numbers.Count(assertion.Trials)} trials afford a tolerance of {Numbers.ShareAwayFrom(narrow, 0)} within the limit of "
                + $"1 in {Numbers.RunsForAtMost(limits.Risk)}"
            : "more trials would catch smaller defects";

    // Rounded down: never more blind than it is.
    static string Times(double ratio) => Numbers.Share(Math.Floor(ratio * 10) / 10);
}
