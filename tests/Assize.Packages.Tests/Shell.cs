using System.Diagnostics;

namespace Assize.Packages.Tests;

/// <summary>
/// Runs the SDK as somebody at a prompt would, without what the running test host put into the environment.
/// </summary>
static class Shell
{
    static readonly TimeSpan Patience = TimeSpan.FromMinutes(5);

    public static async Task<(int ExitCode, string Output)> Dotnet(string folder, params string[] arguments)
    {
        var start = new ProcessStartInfo("dotnet", arguments)
        {
            WorkingDirectory = folder,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        foreach (string name in start.Environment.Keys.Where(IsOfTheHost).ToList())
            start.Environment.Remove(name);
        start.Environment["DOTNET_CLI_USE_MSBUILD_SERVER"] = "0";
        start.Environment["MSBUILDDISABLENODEREUSE"] = "1";

        using var process = Process.Start(start)!;
        using var limit = CancellationTokenSource.CreateLinkedTokenSource(TestContext.Current.CancellationToken);
        limit.CancelAfter(Patience);
        var output = process.StandardOutput.ReadToEndAsync(limit.Token);
        var errors = process.StandardError.ReadToEndAsync(limit.Token);
        try
        {
            await process.WaitForExitAsync(limit.Token);
            return (process.ExitCode, await output + await errors);
        }
        finally
        {
            if (!process.HasExited)
                process.Kill(entireProcessTree: true);
        }
    }

    static bool IsOfTheHost(string name) =>
        name.StartsWith("MSBuild", StringComparison.OrdinalIgnoreCase)
        || name.StartsWith("TESTINGPLATFORM", StringComparison.OrdinalIgnoreCase)
        || name is "DOTNET_CLI_TEST_COMMAND_WORKING_DIRECTORY";
}
