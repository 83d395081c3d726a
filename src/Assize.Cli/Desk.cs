using Spectre.Console;

namespace Assize.Cli;

/// <summary>Where a command reads its folder from and writes its answer to, so that a test can sit at it.</summary>
sealed record Desk(TextWriter Output, TextWriter Errors, bool IsTerminal, string Folder)
{
    public static Desk OfThisProcess() => new(
        Console.Out, Console.Error, !Console.IsOutputRedirected && !Console.IsErrorRedirected, Environment.CurrentDirectory);

    /// <summary>Tables and colours; plain text in a pipe or when NO_COLOR is set.</summary>
    public IAnsiConsole Page()
    {
        var page = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Out = new AnsiConsoleOutput(Output),
            Ansi = IsTerminal ? AnsiSupport.Detect : AnsiSupport.No,
            ColorSystem = IsTerminal ? ColorSystemSupport.Detect : ColorSystemSupport.NoColors,
            Interactive = IsTerminal ? InteractionSupport.Detect : InteractionSupport.No,
        });
        // A pipe has no width: what is wrapped would be of no use to the next program.
        if (!IsTerminal)
            page.Profile.Width = 2000;
        return page;
    }
}
