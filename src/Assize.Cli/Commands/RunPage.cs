using System.CommandLine;

namespace Assize.Cli;

sealed class RunPage : ICommandPage
{
    const double DefaultBudget = 1e-6;

    readonly Argument<string[]> projects = new("projects")
    {
        Description = "Test projects, or the folders they are in.",
        Arity = ArgumentArity.OneOrMore,
    };

    readonly Option<double?> budget = Numbers.Option("--budget", "Probability allowed that a healthy suite goes red in one run. Default: 1e-6.");
    readonly Option<string> configuration = new("--configuration") { Description = "Build configuration.", DefaultValueFactory = _ => "Debug" };
    readonly Option<string[]> extra = new("--pass") { Description = "An argument handed on to the test runner; may be repeated." };
    readonly Option<bool> json = new("--json") { Description = "Answer in JSON; what the tests print goes to the error stream." };

    public string Words => "run";

    public Command Define(Desk desk)
    {
        var command = new Command("run", """
            Builds test projects, reads their tests, runs them with a ledger and holds the suite to its budget.
            Exit code: 0 all kept, 1 tests red, 2 budget or findings not kept, 3 could not run.
            Example: assize run tests/Payments.Tests --budget 1e-6
            """)
        {
            projects, budget, configuration, extra, json,
        };
        command.SetAction((line, token) => RunAsync(line, desk, token));
        return command;
    }

    async Task<int> RunAsync(ParseResult line, Desk desk, CancellationToken token)
    {
        double allowed = line.GetValue(budget) ?? DefaultBudget;
        if (!(allowed is > 0 and <= 1))
            throw new CouldNotRunException($"The budget must be a probability in (0, 1]; it is {Numbers.Text(allowed)}.");

        string folder = Directory.CreateTempSubdirectory("assize-run-").FullName;
        try
        {
            var result = await RunAsync(line, desk, allowed, folder, token);
            if (line.GetValue(json))
                await desk.Output.WriteLineAsync(RunResultJson.Write(result));
            else
                RunResultText.Write(desk, result);
            return (int)result.Exit;
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    async Task<RunResult> RunAsync(ParseResult line, Desk desk, double allowed, string folder, CancellationToken token)
    {
        string ledger = Directory.CreateDirectory(Path.Combine(folder, "ledger")).FullName;
        string findings = Directory.CreateDirectory(Path.Combine(folder, "findings")).FullName;
        string built = line.GetValue(configuration)!;
        var tests = line.GetValue(json) ? desk.Errors : desk.Output;
        var red = new List<string>();
        string[] files = [.. line.GetValue(projects)!.SelectMany(path => TestProject.Files(path, desk.Folder)).Distinct()];
        foreach (string file in files)
        {
            await desk.Errors.WriteLineAsync($"Building {Path.GetRelativePath(desk.Folder, file)} and reading its tests …");
            await SuiteBuild.BuildAsync(file, built, findings, token);
        }

        foreach (string file in files)
        {
            foreach (var project in await TestProject.AskAsync(file, built, token))
            {
                if (!await SuiteRun.IsGreenAsync(project, ledger, line.GetValue(extra) ?? [], tests.WriteLine, token))
                    red.Add(Path.GetRelativePath(desk.Folder, file));
            }
        }

        var read = LedgerReader.Read(ledger);
        return new RunResult(new Tally(read.Entries, allowed), read.TornLines, FindingReader.Read(findings), red);
    }
}
