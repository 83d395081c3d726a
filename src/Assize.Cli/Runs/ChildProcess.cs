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
    public static ProcessStartInfo Dotnet(string folder, params IEnumerable<string> arguments) =>
        new(Environment.GetEnvironmentVariable("DOTNET_HOST_PATH") ?? "dotnet", arguments) { WorkingDirectory = folder };
}
