using System.Text;

namespace Assize;

/// <summary>The only wording of verdicts: for somebody who meets it on a red build, late.</summary>
static class VerdictText
{
    const int Label = 13;

    public static string Of(Verdict verdict)
    {
        var text = new StringBuilder().AppendLine(Headline(verdict)).AppendLine();
        foreach (var (label, content) in Rows(verdict))
            text.AppendLine($"  {label.PadRight(Label)}{content}");
        return text.ToString().TrimEnd();
    }

    /// <summary>One line for the test's output, whatever the verdict.</summary>
    public static string Line(Verdict verdict) =>
        $"{verdict.Outcome} in {Wording.Plural(verdict.Trials, "trial")}: {verdict.Claim.Sentence}; observed {Observed(verdict)}, "
        + $"seed {RunSeed.Text(verdict.Seed)}";

    public static string OfFailedTrial(Exception cause, long trial, string? replayKey) =>
        $"{cause.Message}\nThis was trial {Wording.Number(trial)}, and it threw {cause.GetType().Name} before the claim was decided. "
        + (replayKey is null
            ? "The source takes no generator, so the trial cannot be brought back."
            : $"To run it alone, put .OnlyTrial(\"{replayKey}\") before the last call.");

    static string Headline(Verdict verdict) => verdict.Outcome switch
    {
        Outcome.Refuted => $"Claim refuted: {verdict.Claim.Sentence}.",
        Outcome.Upheld => $"Claim upheld: {verdict.Claim.Sentence}.",
        _ => $"Claim undecided, stopped by its own cap: {verdict.Claim.Sentence}.",
    };

    static IEnumerable<(string, string)> Rows(Verdict verdict)
    {
        yield return ("trial", Short(verdict.Hearing.Site.TrialText));
        yield return ("observed", $"{Observed(verdict)}; the truth lies in {Wording.Interval(verdict.Interval)} "
            + $"with confidence {Wording.Number(verdict.Claim.Confidence)}, whenever one stops");
        yield return ("evidence", Evidence(verdict));
        yield return ("sure", Sure(verdict));
        yield return ("trials", Trials(verdict));
        yield return ("theorem", verdict.Theorem);
        if (verdict.Outcome != Outcome.Upheld)
            yield return ("run again", verdict.CanReplay ? verdict.Hearing.Host.RunAgain(verdict.Seed) : "the source takes no generator: these draws cannot be brought back");
        if (verdict.CanReplay)
            yield return ("last trial", $".OnlyTrial(\"{ReplayKey.Of(verdict.Hearing.Stream, Math.Max(1, verdict.Trials))}\") runs it alone, for the debugger");
    }

    static string Observed(Verdict verdict) => verdict.Trials == 0
        ? "nothing"
        : $"{Wording.Share(verdict.Observed, verdict.Trials)} ({Wording.Number(verdict.Report.Successes)} of {Wording.Number(verdict.Trials)})";

    static string Evidence(Verdict verdict)
    {
        double weaker = Math.Min(verdict.LogEvidenceAgainstDefectBelow, verdict.LogEvidenceAgainstDefectAbove);
        return $"against the claim {Wording.Odds(verdict.LogEvidenceAgainstClaim)}, against a defect {Wording.Odds(weaker)}";
    }

    static string Sure(Verdict verdict) => verdict.Outcome switch
    {
        Outcome.Refuted => $"were the claim right, this would happen in {Wording.OnceIn(verdict.Claim.Risk)} at most",
        Outcome.Upheld => $"were there a defect, this would happen in {Wording.OnceIn(1 - verdict.Claim.Confidence)} at most",
        _ => "nothing is said either way: allow more trials or more time, or claim less",
    };

    static string Trials(Verdict verdict) => verdict.Report.Cap == long.MaxValue
        ? Wording.Number(verdict.Trials)
        : $"{Wording.Number(verdict.Trials)} of {Wording.Number(verdict.Report.Cap)} at most";

    static string Short(string trialText)
    {
        string line = string.Join(' ', trialText.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));
        return line.Length <= 100 ? line : line[..99] + "…";
    }
}
