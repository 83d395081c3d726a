using System.Text;

namespace Assize;

/// <summary>The only wording of verdicts: for somebody who meets it on a red build, late.</summary>
static class VerdictText
{
    const int LabelWidth = 11;
    const int LongestTrialText = 100;

    public static string Of(Verdict verdict)
    {
        var text = new StringBuilder().Append(Headline(verdict)).Append("\n\n");
        foreach (var (label, content) in Rows(verdict))
            text.Append($"  {label.PadRight(LabelWidth)}{content}\n");
        if (verdict.Outcome != Outcome.Upheld)
            text.Append('\n').Append(Replay(verdict));
        return text.ToString().TrimEnd();
    }

    /// <summary>One line for the test's output, whatever the verdict.</summary>
    public static string Line(Verdict verdict) => $"{Headline(verdict)} Seed {RunSeed.Text(verdict.Seed)}.";

    public static string OfFailedTrial(Exception cause, long trial, string? replayKey) =>
        $"{cause.Message}\n\nThis is trial {Wording.Number(trial)}: it threw {cause.GetType().Name} before the claim was decided.\n"
        + (replayKey is null
            ? "The source takes no generator, so the trial cannot be brought back."
            : $"To run it alone, under the debugger, write .OnlyTrial(\"{replayKey}\") after the claim.");

    public static string OfOnlyTrial(ReplayKey key, string? draw)
    {
        string runtime = key.Runtime == Environment.Version ? ""
            : $" Its key was made on .NET {key.Runtime}; this is .NET {Environment.Version}, which may draw differently.";
        return $"Trial {Wording.Number(key.Trial)} ran alone and yielded {draw}.{runtime} "
            + "One trial judges no claim: take OnlyTrial out again.";
    }

    static string Headline(Verdict verdict)
    {
        string seen = verdict.Trials == 0
            ? "not one trial was run"
            : $"observed {Wording.Share(verdict.Observed, verdict.Trials)} in {Wording.Trials(verdict.Trials)}";
        return $"{verdict.Outcome}: {verdict.Claim.Sentence}; {seen}.";
    }

    static IEnumerable<(string Label, string Content)> Rows(Verdict verdict)
    {
        yield return ("trial", OneLine(verdict.Hearing.Site.TrialText));
        yield return ("place", $"{verdict.Hearing.Host.Test}, line {verdict.Hearing.Site.Line}");
        yield return ("trials", Trials(verdict));
        yield return ("true rate", $"{Wording.Interval(verdict.Interval)}, with confidence {Wording.Number(verdict.Claim.Confidence)} "
            + "whenever one stops");
        yield return ("", "(not the race turned around: it may reach into what the race has ruled out)");
        yield return ("evidence", Evidence(verdict));
        yield return ("theorem", verdict.Theorem);
        yield return ("meaning", Meaning(verdict));
    }

    static string Trials(Verdict verdict)
    {
        var report = verdict.Report;
        string used = $"{Wording.Number(report.Trials)} of {Wording.Number(report.Cap)} at most, "
            + $"{Wording.Number(report.Successes)} of them successes";
        return report.Accepts is { } accepts
            ? $"{used}; {Wording.Number(accepts.Low)} to {Wording.Number(accepts.High)} uphold the claim"
            : used;
    }

    static string Evidence(Verdict verdict)
    {
        var report = verdict.Report;
        var parts = new List<string> { $"{Wording.Odds(report.LogEvidenceAgainstClaim)} against the claim" };
        if (report.LogEvidenceAgainstDefectBelow is { } below)
            parts.Add($"{Wording.Odds(below)} against a defect below");
        if (report.LogEvidenceAgainstDefectAbove is { } above)
            parts.Add($"{Wording.Odds(above)} against a defect above");
        return string.Join("; ", parts);
    }

    static string Meaning(Verdict verdict) => verdict.Outcome switch
    {
        Outcome.Refuted => $"of runs where the claim is right, {Wording.OnceIn(verdict.Claim.Risk)} at most is refuted",
        Outcome.Upheld => $"of runs with a defect, {Wording.OnceIn(verdict.Report.Miss)} at most is upheld",
        _ => "a cap of the claim's own stopped it, and neither was shown: allow more trials or time, or a larger defect",
    };

    static string Replay(Verdict verdict)
    {
        if (!verdict.CanReplay)
            return "The trial takes no generator, so these draws cannot be brought back: let it draw from the Random it is given.";

        var hearing = verdict.Hearing;
        string command = $"Run it again, with the same draws:\n  {hearing.Host.RunAgain(verdict.Seed)}\n";
        return verdict.Trials == 0
            ? command
            : $"{command}Its last trial alone, under the debugger, with this after the claim:\n"
                + $"  .OnlyTrial(\"{ReplayKey.Of(verdict.Seed, hearing.Stream, verdict.Trials)}\")";
    }

    static string OneLine(string trialText)
    {
        string line = string.Join(' ', trialText.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
        return line.Length <= LongestTrialText ? line : line[..(LongestTrialText - 1)] + "…";
    }
}
