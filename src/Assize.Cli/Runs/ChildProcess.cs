using System.Diagnostics;

namespace Assize.Cli;

/// <summary>Runs another program and hands over what it prints, line by line.</summary>
static class ChildProcess
{
    public static async Task<int> RunAsync(ProcessStartInfo start, Action<string> line, CancellationToken token)
    {
        start.RedirectStandardOutput = start.RedirectStandardError = true;
        using var process = new Process { StartInfo = start };
        object gate = new();
        process.OutputDataReceived += Received;
        process.ErrorDataReceived += Received;
        process.Start();
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        try
        {
            await process.WaitForExitAsync(token);
        }
        catch (OperationCanceledException)
        {
            process.Kill(entireProcessTree: true);
            throw;
        }

        return process.ExitCode;

        void Received(object sender, DataReceivedEventArgs data)
        {
            if (data.Data is null)
                return;
            lock (gate)
                line(data.Data);
        }
    }

    /// <summary>The `dotnet` that runs this tool, so that no other SDK is picked up by chance.</summary>
    public static ProcessStartInfo Dotnet(string folder, params IEnumerable<string> arguments)
    {
        var start = new ProcessStartInfo(Environment.GetEnvironmentVariable("DOTNET_HOST_PATH") ?? "dotnet", arguments)
        {
            WorkingDirectory = folder,
        };
        foreach (string name in start.Environment.Keys.Where(IsOfAnotherHost).ToList())
            start.Environment.Remove(name);
        return start;
    }

    // Called from a build or a test run, this tool must not pass on what steers that one.
    static bool IsOfAnotherHost(string name) =>
        name.StartsWith("MSBuild", StringComparison.OrdinalIgnoreCase)
        || name.StartsWith("TESTINGPLATFORM", StringComparison.OrdinalIgnoreCase)
        || name is "DOTNET_CLI_TEST_COMMAND_WORKING_DIRECTORY";
}
