namespace Assize.Cli.Tests;

public class CommandLineTests
{
    [Fact]
    public void Every_command_page_is_found_and_can_be_asked_for_help()
    {
        var pages = CommandLine.Pages().Select(page => page.Words).Order(StringComparer.Ordinal);

        Assert.Equal(["inspect", "plan", "plan rate", "run", "tally"], pages);
    }

    [Fact]
    public async Task A_word_that_is_no_command_could_not_run()
    {
        var (exit, output, errors) = await TestDesk.SayAsync("plam");

        Assert.Equal((3, ""), (exit, output));
        Assert.Contains("plam", errors, StringComparison.Ordinal);
        Assert.Contains("assize --help", errors, StringComparison.Ordinal);
    }
}
