using System.CommandLine;

namespace Assize.Cli;

sealed class InspectPage : ICommandPage
{
    readonly Argument<string> path = new("path")
    {
        Description = "A solution or project, read as its build compiles it; or a folder, read as plain sources.",
    };

    readonly Option<string?> since = new("--since") { Description = "Only tests with lines that differ from this git revision.", HelpName = "revision" };
    readonly Option<double?> budget = Numbers.Option("--budget", "Probability allowed that a healthy suite goes red in one run.");
    readonly Option<string?> markdown = new("--markdown") { Description = "Also write a Markdown report, for a comment on a review.", HelpName = "file" };
    readonly Option<string?> sarif = new("--sarif") { Description = "Also write the findings as SARIF 2.1.0.", HelpName = "file" };
    readonly Option<bool> json = new("--json") { Description = "Answer in JSON." };

    public string Words => "inspect";

    public Command Define(Desk desk)
    {
        var command = new Command("inspect", """
            Reads the tests of a suite and says how often each randomized assertion is red on healthy code, which defect it catches
            and how many trials it needs. Nothing is built or run, and the suite need not know this tool.
            Exit code: 0 all kept, 2 budget or findings not kept, 3 could not run.
            Example: assize inspect Payments.sln --since origin/main --sarif findings.sarif
            """)
        {
            path, since, budget, markdown, sarif, json,
        };
        command.SetAction((line, token) => RunAsync(line, desk, token));
        return command;
    }

    async Task<int> RunAsync(ParseResult line, Desk desk, CancellationToken token)
    {
        if (line.GetValue(budget) is { } allowed && !(allowed is > 0 and <= 1))
            throw new CouldNotRunException($"The budget must be a probability in (0, 1]; it is {Numbers.Text(allowed)}.");
        try
        {
            var inspected = await InspectAsync(line, desk, token);
            await SaveAsync(line.GetValue(markdown), desk, () => InspectedMarkdown.Write(inspected), token);
            await SaveAsync(line.GetValue(sarif), desk, () => InspectedSarif.Write(inspected), token);
            if (line.GetValue(json))
                await desk.Output.WriteLineAsync(InspectedJson.Write(inspected));
            else
                InspectedText.Write(desk, inspected);
            return (int)inspected.Exit;
        }
        catch (OperationCanceledException)
        {
            throw new CouldNotRunException("Stopped before the end; nothing is reported.");
        }
    }

    async Task<Inspected> InspectAsync(ParseResult line, Desk desk, CancellationToken token)
    {
        string full = Path.GetFullPath(line.GetValue(path)!, desk.Folder);
        var sources = await SourcesAsync(full, line.GetValue(path)!, token);
        Func<Place, bool> isWanted = line.GetValue(since) is { } revision
            ? (await ChangedLines.SinceAsync(revision, sources.Root, token)).Touch
            : _ => true;
        var inspected = Inspector.Inspect(sources, isWanted, line.GetValue(budget), done => Progress(desk, done), token);
        if (desk.IsTerminal)
            await desk.Errors.WriteAsync("\r\u001b[K");
        return inspected;
    }

    static async Task<Sources> SourcesAsync(string full, string given, CancellationToken token)
    {
        if (Directory.Exists(full))
            return FolderSources.Read(Path.TrimEndingDirectorySeparator(full), "", token);
        if (!File.Exists(full))
            throw new CouldNotRunException($"'{Inert.Line(given)}' does not exist. Give a solution, a project or a folder of sources.");
        if (!BuiltSources.IsSolution(full) && Path.GetExtension(full) is not ".csproj")
            throw new CouldNotRunException($"'{Inert.Line(given)}' is neither a solution nor a C# project. Give one of these, or a folder of sources.");
        var (built, reason) = await BuiltSources.ReadAsync(full, token);
        return built ?? FolderSources.Read(Path.GetDirectoryName(full)!, $" (as built it could not be read: {reason})", token);
    }

    static void Progress(Desk desk, int done)
    {
        if (desk.IsTerminal && done % 50 == 0)
            desk.Errors.Write($"\rReading tests: {Numbers.Text(done)} files");
    }

    static async Task SaveAsync(string? file, Desk desk, Func<string> content, CancellationToken token)
    {
        if (file is null)
            return;
        try
        {
            await File.WriteAllTextAsync(Path.GetFullPath(file, desk.Folder), content(), token);
        }
        catch (Exception exception) when (exception is IOException or UnauthorizedAccessException)
        {
            throw new CouldNotRunException($"'{Inert.Line(file)}' could not be written: {exception.Message}");
        }
    }
}
