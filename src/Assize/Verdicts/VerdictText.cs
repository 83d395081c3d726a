using System.Text;

namespace Assize;

/// <summary>The only wording of verdicts: for somebody who meets it on a red build, late.</summary>
static class VerdictText
{
    const int LabelWidth = 13;
    const int LongestTrialText = 100;

    public static string Of(Verdict verdict)
    {
        var text = new StringBuilder($"Claim {Called(verdict)}: {verdict.Claim.Sentence}.\n\n");
        foreach (var (label, content) in Rows(verdict))
            text.Append($"  {label.PadRight(LabelWidth)}{content}\n");
        return text.ToString().TrimEnd();
    }

    /// <summary>One line for the test's output, whatever the verdict.</summary>
    public static string Line(Verdict verdict) => $"{verdict.Outcome} in {Wording.Trials(verdict.Trials)}: "
        + $"{verdict.Claim.Sentence}; observed {Observed(verdict)}; seed {RunSeed.Text(verdict.Seed)}";

    /// <summary>One line for the test's output while trials still run.</summary>
    public static string Progress(Claim claim, RaceReport report) =>
        $"Running: {Wording.Number(report.Trials)} of {Wording.Trials(report.Cap)} at most; {claim.Sentence}";

    public static string OfFailedTrial(Exception cause, long trial, string? replayKey) =>
        $"{cause.Message}\n\nThis is trial {Wording.Number(trial)}: it threw {cause.GetType().Name} before the claim was decided.\n"
        + (replayKey is null
            ? "The source takes no generator, so the trial cannot be brought back."
            : $"To run it alone, under the debugger, write .OnlyTrial(\"{replayKey}\") after the claim.");

    public static string OfOnlyTrial(ReplayKey key, string? draw)
    {
        string runtime = key.Runtime == Environment.Version.Major ? ""
            : $" Its key was made on .NET {key.Runtime}; this is .NET {Environment.Version.Major}, which may draw differently.";
        return $"Trial {Wording.Number(key.Trial)} ran alone and yielded {draw}.{runtime} "
            + "One trial judges no claim: take OnlyTrial out again.";
    }

    static string Called(Verdict verdict) => verdict.Outcome switch
    {
        Outcome.Refuted => "refuted",
        Outcome.Upheld => "upheld",
        _ => "undecided",
    };

    static IEnumerable<(string Label, string Content)> Rows(Verdict verdict)
    {
        var hearing = verdict.Hearing;
        yield return (hearing.Site.Replay == Replay.Sample ? "sample" : "trial", OneLine(hearing.Site.TrialText));
        var statement = verdict.Claim.Statement;
        if (verdict.Report.Contradiction is { } contradiction)
            yield return ("fact broken", contradiction);
        yield return ("observed", Observed(verdict));
        foreach (var detail in verdict.Report.Details)
            yield return detail;
        if (!double.IsNaN(verdict.Interval.Lower))
            yield return ($"true {statement.Quantity}", $"{Wording.Interval(verdict.Interval, statement.Edges?.Domain)} "
                + $"with confidence {Wording.Number(verdict.Claim.Confidence)}, whenever one stops; not the race turned around");
        yield return ("evidence", Evidence(verdict.Report));
        yield return ("meaning", Meaning(verdict));
        yield return ("trials", $"{Wording.Number(verdict.Trials)} of {Wording.Number(verdict.Report.Cap)} at most");
        yield return ("theorem", Theorem(verdict.Report));
        foreach (var row in Again(verdict))
            yield return row;
    }

    static IEnumerable<(string Label, string Content)> Again(Verdict verdict)
    {
        var hearing = verdict.Hearing;
        if (hearing.Site.Replay == Replay.Sample)
            yield break;

        yield return ("seed", $"{RunSeed.Text(verdict.Seed)} on .NET {Environment.Version.Major}");
        if (!verdict.CanReplay)
            yield return ("run again", "not with these draws: the trial takes no generator. Let it draw from the Random it is given");
        else if (!verdict.IsUpheld)
            yield return ("run again", hearing.Host.RunAgain(verdict.Seed));
        long last = verdict.Report.LastTrial ?? verdict.Trials;
        if (hearing.Site.Replay == Replay.Trial && !verdict.IsUpheld && last > 0)
            yield return ("last trial", $".OnlyTrial(\"{ReplayKey.Of(verdict.Seed, hearing.Stream, last)}\") "
                + "after the claim runs it alone, for the debugger");
    }

    static string Observed(Verdict verdict) => verdict.Trials == 0
        ? "nothing, for not one trial was run"
        : verdict.Report.Seen ?? Wording.Value(verdict.Observed, verdict.Interval);

    static string Evidence(RaceReport report)
    {
        var parts = new List<string> { $"against the claim {Wording.Odds(report.LogEvidenceAgainstClaim)}" };
        if (report.LogEvidenceAgainstDefectBelow is { } below)
            parts.Add($"against a defect below {Wording.Odds(below)}");
        if (report.LogEvidenceAgainstDefectAbove is { } above)
            parts.Add($"against a defect above {Wording.Odds(above)}");
        return string.Join("; ", parts);
    }

    static string Meaning(Verdict verdict) => verdict.Outcome switch
    {
        Outcome.Refuted when verdict.Report.Contradiction is not null =>
            "the draws are not what the claim takes for granted: mend the code, or the fact that the claim was given",
        Outcome.Refuted => $"were the claim right, this would happen in {Wording.OnceIn(verdict.Claim.Risk)} at most",
        Outcome.Upheld => $"were there a defect, this would happen in {Wording.OnceIn(verdict.Report.Miss)} at most",
        _ => "the claim's own cap stopped it, and neither was shown: allow more trials or time, or a larger defect",
    };

    static string Theorem(RaceReport report) => report.Accepts is { } accepts
        ? $"{report.Theorem}: {accepts} uphold the claim"
        : report.Theorem;

    static string OneLine(string trialText)
    {
        string line = string.Join(' ', trialText.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
        return line.Length <= LongestTrialText ? line : line[..(LongestTrialText - 1)] + "…";
    }
}
