namespace Assize.Cli.Tests;

public class CommandLineTests
{
    [Fact]
    public async Task Every_command_page_is_found_and_can_be_asked_for_help()
    {
        string[] pages = [.. CommandLine.Pages().Select(page => page.Words)];

        Assert.Equal(Testing.Repository.Files("src/Assize.Cli/Commands", "*Page.cs").Count(file => file != "ICommandPage.cs"), pages.Distinct().Count());
        Assert.Contains("plan rate", pages);
        foreach (string page in pages)
        {
            var (exit, output, _) = await TestDesk.SayAsync([.. page.Split(' '), "--help"]);
            Assert.Equal(0, exit);
            Assert.Contains("Usage:", output, StringComparison.Ordinal);
        }
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
