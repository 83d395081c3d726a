namespace Assize.Analyzers;

/// <summary>The parts that the sentences about a hand-written assertion share.</summary>
static class AssertionText
{
    /// <summary>What the assertion asks: trials, rate and the counts that pass.</summary>
    public static string Asks(AssertionReading reading)
    {
        string text = $"{Numbers.Count(reading.Trials)} trials at rate {Numbers.Share(reading.Rate.Value)} "
            + $"must give {Numbers.Count(reading.AcceptLow)} to {Numbers.Count(reading.AcceptHigh)} successes";
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
            ? $"{Numbers.Count(trials)} trials with the same band of rates bring it to {limit} or less"
            : $"no number of trials brings this band to {limit}";
    }

    /// <summary>What the assertion catches as it stands.</summary>
    public static string Catches(AssertionReading reading, Limits limits) =>
        reading.RateCaught(limits.Confidence) is { } rate
            ? $"as written it catches a rate of {Numbers.ShareAwayFrom(rate, reading.Rate.Value)} with probability {Numbers.Share(limits.Confidence)}"
            : "as written it surely catches no wrong rate";
}
