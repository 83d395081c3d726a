namespace Assize.Cli.Tests;

/// <summary>Runs one line of the tool in this process and keeps what it says.</summary>
static class TestDesk
{
    public static async Task<(int Exit, string Output, string Errors)> SayAsync(params string[] line)
    {
        using StringWriter output = new(), errors = new();
        var desk = new Desk(output, errors, IsTerminal: false, Testing.Repository.Root);
        int exit = await CommandLine.InvokeAsync(line, desk, TestContext.Current.CancellationToken);
        return (exit, output.ToString().ReplaceLineEndings("\n"), errors.ToString().ReplaceLineEndings("\n"));
    }
}
