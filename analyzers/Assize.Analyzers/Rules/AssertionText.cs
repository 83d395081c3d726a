using Assize.Bounds;

namespace Assize.Analyzers;

/// <summary>The parts that the sentences about a hand-written assertion share.</summary>
static class AssertionText
{
    /// <summary>What the assertion asks: trials, the value on right code and what passes.</summary>
    public static string Asks(AssertionReading reading)
    {
        string text = reading.Statistic == Statistic.Proportion ? Counted(reading) : Measured(reading);
        if (reading.Tolerance > 0)
            text += $", tolerance {Numbers.Share(reading.Tolerance)}";
        if (reading.Row is not null)
            text += $", data row {reading.Row}";
        if (reading.Runs.Repeats > 1)
            text += $", {Numbers.Count(reading.Runs.Repeats)} times a run";
        return reading.Runs.Tries > 1 ? text + $", best of {Numbers.Count(reading.Runs.Tries)} tries" : text;
    }

    /// <summary>What would help.</summary>
    public static string Cure(AssertionReading reading, Limits limits)
    {
        string limit = $"1 in {Numbers.RunsForAtMost(limits.Risk)}";
        if (!reading.MoreTrialsHelp)
            return "its band is made of standard errors, so more trials do not help";
        return reading.TrialsNeeded(limits.Risk) is { } trials
            ? $"{Numbers.Count(trials)} trials with the same band of {Unit(reading)}s bring it to {limit} or less"
            : $"no number of trials brings this band to {limit}";
    }

    /// <summary>What the assertion catches as it stands.</summary>
    public static string Catches(AssertionReading reading, Limits limits)
    {
        if (reading.Target is not { } target || reading.DefectCaught(limits.Confidence) is not { } defect)
            return $"as written it surely catches no wrong {Unit(reading)}";
        string caught = reading.Statistic == Statistic.Proportion
            ? Numbers.ShareAwayFrom(target + defect, target) : Numbers.AwayFrom(target + defect, target);
        return $"as written it catches a {Unit(reading)} of {caught} with probability {Numbers.Share(limits.Confidence)}";
    }

    /// <summary>What the target is called.</summary>
    public static string Unit(AssertionReading reading) => reading.Statistic switch
    {
        Statistic.Proportion or Statistic.Some or Statistic.Prefix => "rate",
        Statistic.Buckets or Statistic.Coverage => "share",
        Statistic.Mean or Statistic.Sum or Statistic.Difference or Statistic.Single => "mean",
        _ => StatisticNames.Of(reading.Statistic),
    };

    static string Counted(AssertionReading reading) =>
        $"{Numbers.Count(reading.Trials)} trials at rate {Numbers.Share(reading.Target ?? 0)} "
        + $"must give {Numbers.Count((long)(reading.Accepted.Low ?? 0))} to "
        + $"{Numbers.Count((long)(reading.Accepted.High ?? reading.Trials))} successes";

    static string Measured(AssertionReading reading)
    {
        string text = $"{Numbers.Count(reading.Trials)} trials must give a {StatisticNames.Of(reading.Statistic)}{Within(reading.Accepted)}";
        return reading.Target is { } target ? $"{text}, {Numbers.Share(target)} on right code" : text;
    }

    static string Within(Band band) => (band.Low, band.High) switch
    {
        ({ } low, { } high) => $" from {Numbers.Share(low)} to {Numbers.Share(high)}",
        ({ } low, null) => $" {(band.LowPasses ? "of at least" : "above")} {Numbers.Share(low)}",
        (null, { } high) => $" {(band.HighPasses ? "of at most" : "below")} {Numbers.Share(high)}",
        _ => "",
    };
}
