namespace Assize;

/// <summary>Records verdicts in the folder that ASSIZE_LEDGER names; without it, nowhere.</summary>
static class Ledger
{
    public const string Variable = "ASSIZE_LEDGER";

    static readonly Lock Gate = new();
    static LedgerWriter? _writer;

    /// <summary>Names this process in every entry.</summary>
    public static string Run { get; } = Guid.NewGuid().ToString("n");

    public static void Record(Verdict verdict)
    {
        if (Environment.GetEnvironmentVariable(Variable) is not { Length: > 0 } folder)
            return;

        lock (Gate)
        {
            if (_writer?.Folder != folder)
                _writer = LedgerWriter.In(folder);
            _writer.Write(Entry(verdict));
        }
    }

    static LedgerEntry Entry(Verdict verdict)
    {
        var (hearing, report) = (verdict.Hearing, verdict.Report);
        var claim = hearing.Claim;
        var statement = claim.Statement;
        return new LedgerEntry
        {
            Schema = LedgerEntry.CurrentSchema,
            Run = Run,
            Seed = RunSeed.Text(hearing.Seed),
            Stream = RunSeed.Text(hearing.Stream),
            Assembly = hearing.Host.Assembly,
            Test = hearing.Host.Test,
            History = claim.Name ?? $"{hearing.Host.Method}: {claim.Sentence}",
            Claim = claim.Sentence,
            Family = statement.Family,
            Target = statement.Target,
            Tolerance = statement.Tolerance,
            Defect = statement.Defect,
            LowerDefect = statement.Edges?.LowerDefect,
            LowerEdge = statement.Edges?.LowerEdge,
            UpperEdge = statement.Edges?.UpperEdge,
            UpperDefect = statement.Edges?.UpperDefect,
            Risk = claim.Risk,
            Confidence = claim.Confidence,
            Trials = report.Trials,
            Successes = report.Successes,
            Counts = report.Counts,
            Cap = report.Cap,
            Observed = Finite(report.Observed),
            IntervalLower = Finite(report.Interval.Lower),
            IntervalUpper = Finite(report.Interval.Upper),
            LogEvidenceAgainstClaim = report.LogEvidenceAgainstClaim,
            LogEvidenceAgainstDefectBelow = report.LogEvidenceAgainstDefectBelow,
            LogEvidenceAgainstDefectAbove = report.LogEvidenceAgainstDefectAbove,
            Verdict = verdict.Outcome,
            Theorem = report.Theorem,
            Seconds = verdict.Elapsed.TotalSeconds,
            File = hearing.Site.File,
            Line = hearing.Site.Line,
            Replayable = hearing.Site.CanReplay,
            Approximate = false,
        };
    }

    // JSON has no infinity: an end that is not there is left out.
    static double? Finite(double value) => double.IsFinite(value) ? value : null;
}
