using System.CommandLine;

namespace Assize.Cli;

sealed class TallyPage : ICommandPage
{
    const double DefaultBudget = 1e-6;

    readonly Argument<string[]> ledgers = new("ledgers")
    {
        Description = "Ledger files, or folders of them: together one run of the suite.",
        Arity = ArgumentArity.OneOrMore,
    };

    readonly Option<double?> budget = Numbers.Option("--budget", "Probability allowed that a healthy suite goes red in one run. Default: 1e-6.");
    readonly Option<double?> years = Numbers.Option("--years", "In place of a budget: one false red expected in this many years, or fewer.");
    readonly Option<double?> runs = Numbers.Option("--runs-per-day", "Runs of the suite a day, with --years.");
    readonly Option<bool> json = new("--json") { Description = "Answer in JSON." };

    public string Words => "tally";

    public Command Define(Desk desk)
    {
        var command = new Command("tally", """
            Adds up what the claims in ledgers may spend on false failures, and holds it against a budget.
            Exit code: 0 all kept, 1 a claim is refuted or undecided, 2 budget not kept, 3 could not run.
            Example: assize tally ledgers --years 10 --runs-per-day 50
            """)
        {
            ledgers, budget, years, runs, json,
        };
        command.SetAction(line =>
        {
            var result = Read(line, desk.Folder);
            if (line.GetValue(json))
                desk.Output.WriteLine(TallyJson.Write(result));
            else
                TallyText.Write(desk.Page(), result);
            return (int)result.Exit;
        });
        return command;
    }

    TallyResult Read(ParseResult line, string folder)
    {
        double allowed = Allowed(line);
        string[] files = [.. line.GetValue(ledgers)!.SelectMany(path => Files(path, folder)).Distinct().Order(StringComparer.Ordinal)];
        var entries = new List<LedgerEntry>();
        int torn = 0;
        foreach (string file in files)
        {
            var read = Content(file);
            entries.AddRange(read.Entries);
            torn += read.TornLines;
        }

        return entries.Count > 0 ? new TallyResult(new Tally(entries, allowed), torn, files.Length) : throw new CouldNotRunException(
            $"No claim is recorded in {string.Join(", ", line.GetValue(ledgers)!)}. Set ASSIZE_LEDGER to a folder while the tests run.");
    }

    static IEnumerable<string> Files(string path, string folder)
    {
        string full = Path.GetFullPath(path, folder);
        if (Directory.Exists(full))
            return Directory.EnumerateFiles(full, "*.jsonl");
        return File.Exists(full) ? [full] : throw new CouldNotRunException($"'{path}' does not exist. Give a ledger file or a folder of them.");
    }

    static LedgerContent Content(string file)
    {
        LedgerContent content;
        try
        {
            content = LedgerReader.Read(file);
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException)
        {
            throw new CouldNotRunException(cause.Message);
        }

        // A risk that is no probability would make the sum look smaller than it is.
        return content.Entries.FirstOrDefault(entry => !(entry.Risk is > 0 and <= 1)) is { } odd
            ? throw new CouldNotRunException($"{file}: the claim of '{odd.Test}' states the risk {Numbers.Text(odd.Risk)}, which is no "
                + "probability in (0, 1]. Leave the file out, or run those tests again.")
            : content;
    }

    double Allowed(ParseResult line)
    {
        if (line.GetValue(years) is null && line.GetValue(runs) is null)
            return Probability(line.GetValue(budget) ?? DefaultBudget);
        if (line.GetValue(budget) is not null)
            throw new CouldNotRunException("--budget and --years exclude each other: both say what a run may spend.");
        if (line.GetValue(years) is not { } span || line.GetValue(runs) is not { } daily)
            throw new CouldNotRunException("--years and --runs-per-day go together, for example --years 10 --runs-per-day 50.");

        double times = 365.25 * span * daily;
        if (!(span > 0 && daily > 0 && times is >= 1 and <= 1e15))
            throw new CouldNotRunException($"{Numbers.Text(span)} years at {Numbers.Text(daily)} runs a day is no number of runs from 1 to 1e15.");
        return Math.BitDecrement(1 / Math.BitIncrement(times));
    }

    static double Probability(double value) => value is > 0 and <= 1 ? value
        : throw new CouldNotRunException($"The budget must be a probability in (0, 1]; it is {Numbers.Text(value)}.");
}
