namespace Assize.Tests.Ledgers;

public sealed class LedgerTests : IDisposable
{
    readonly string _folder = Directory.CreateTempSubdirectory("assize-ledger-").FullName;

    public LedgerTests() => Environment.SetEnvironmentVariable("ASSIZE_LEDGER", _folder);

    public void Dispose()
    {
        Environment.SetEnvironmentVariable("ASSIZE_LEDGER", null);
        Directory.Delete(_folder, recursive: true);
    }

    [Fact]
    public void Every_verdict_is_one_line_and_comes_back_as_it_was()
    {
        var verdict = Claim.RateAtMost(0.1, defect: 0.1).Named("a </script> \u202e name").Judge(rng => rng.NextDouble() < 0.05);

        var entry = Own("a </script> \u202e name").Single();

        Assert.Equal((1, "rate", Outcome.Upheld), (entry.Schema, entry.Family, entry.Verdict));
        Assert.Equal((0.1, 0.0, 0.1, 1e-9, 0.999), (entry.Target, entry.Tolerance, entry.Defect, entry.Risk, entry.Confidence));
        Assert.Equal((verdict.Trials, verdict.Observed), (entry.Trials, (double?)entry.Successes / entry.Trials));
        Assert.Null(entry.LogEvidenceAgainstDefectBelow);
        Assert.Null(entry.LowerEdge);
        Assert.False(entry.Approximate);
    }

    [Fact]
    public void A_torn_last_line_is_counted_and_the_whole_ones_are_read()
    {
        Claim.RateAtMost(0, defect: 0.5).Named("torn").Judge(_ => false);
        string line = File.ReadLines(Directory.GetFiles(_folder).Single()).First();
        string other = Write($"{line}\n{line}\n{line[..40]}");

        var content = LedgerReader.Read(other);

        Assert.Equal((2, 1), (content.Entries.Count, content.TornLines));
    }

    [Theory]
    [InlineData("{\"schema\":2}\n", "schema 2 is newer")]
    [InlineData("{}\n", "line 1")]
    [InlineData("not json\n", "line 1")]
    [InlineData("[1]\n", "line 1")]
    public void What_is_no_entry_is_named_with_its_line(string text, string reason)
    {
        string file = Write(text);

        var unreadable = Assert.Throws<LedgerUnreadableException>(() => LedgerReader.Read(file));

        Assert.Contains(reason, unreadable.Message, StringComparison.Ordinal);
        Assert.Contains(file, unreadable.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void An_empty_ledger_holds_nothing_and_a_missing_one_is_named()
    {
        Assert.Empty(LedgerReader.Read(Write("")).Entries);
        Assert.Contains("nowhere", Assert.Throws<LedgerUnreadableException>(() => LedgerReader.Read("nowhere")).Message, StringComparison.Ordinal);
    }

    // Claims of tests that run beside this one are recorded too.
    IEnumerable<LedgerEntry> Own(string name) => LedgerReader.Read(_folder).Entries.Where(entry => entry.History.Contains(name, StringComparison.Ordinal));

    string Write(string text)
    {
        string file = Path.Combine(_folder, $"{Guid.NewGuid():n}.jsonl");
        File.WriteAllText(file, text);
        return file;
    }
}
