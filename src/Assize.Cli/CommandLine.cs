using System.CommandLine;
using System.CommandLine.Help;
using Assize.Bounds;

namespace Assize.Cli;

/// <summary>Builds the tree of commands from the pages in this assembly and runs one line.</summary>
static class CommandLine
{
    const string Name = "assize";

    public static async Task<int> InvokeAsync(string[] arguments, Desk desk, CancellationToken token = default)
    {
        var result = Tree(desk).Parse(arguments);
        if (result.Errors.Count > 0)
        {
            foreach (var error in result.Errors)
                await desk.Errors.WriteLineAsync(error.Message);
            await desk.Errors.WriteLineAsync($"See: {Words(result.CommandResult.Command)}--help");
            return (int)ExitCode.CouldNotRun;
        }

        try
        {
            var settings = new InvocationConfiguration { Output = desk.Output, Error = desk.Errors, EnableDefaultExceptionHandler = false };
            return await result.InvokeAsync(settings, token);
        }
        catch (Exception exception) when (exception is CouldNotRunException or ClaimRefusedException)
        {
            await desk.Errors.WriteLineAsync(exception.Message);
            return (int)ExitCode.CouldNotRun;
        }
    }

    public static Command Tree(Desk desk)
    {
        // A root command would take the name of whatever file started it.
        var root = new Command(Name, "Plans claims about random code, runs test suites and holds them to a false-failure budget.")
        {
            new HelpOption { Recursive = true },
            new VersionOption(),
        };
        foreach (var page in Pages().OrderBy(page => page.Words, StringComparer.Ordinal))
            Group(root, page.Words.Split(' ')[..^1]).Subcommands.Add(page.Define(desk));
        return root;
    }

    public static IEnumerable<ICommandPage> Pages() =>
        typeof(CommandLine).Assembly.GetTypes()
            .Where(type => type is { IsClass: true, IsAbstract: false } && type.IsAssignableTo(typeof(ICommandPage)))
            .Select(type => (ICommandPage)Activator.CreateInstance(type)!);

    // Sorted by words, a group stands before its members.
    static Command Group(Command root, string[] words) =>
        words.Aggregate(root, (parent, word) => parent.Subcommands.Single(command => command.Name == word));

    static string Words(Command command) => string.Concat(command.Parents.OfType<Command>().Select(Words)) + command.Name + " ";
}
