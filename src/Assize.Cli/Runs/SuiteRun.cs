namespace Assize.Cli;

/// <summary>Runs built test projects with a ledger.</summary>
static class SuiteRun
{
    /// <summary>Runs one project's tests and says whether they are green.</summary>
    public static async Task<bool> IsGreenAsync(
        TestProject project, string ledger, IEnumerable<string> extra, Action<string> line, CancellationToken token)
    {
        // The runner's own choice depends on the folder it is called from; the assembly itself does not.
        string[] call = project.RunsItself ? ["exec", project.Assembly, .. extra] : ["vstest", project.Assembly, .. extra];
        var start = ChildProcess.Dotnet(Path.GetDirectoryName(project.File)!, call);
        start.Environment["ASSIZE_LEDGER"] = ledger;
        // What is read line by line is no terminal, whatever the runner thinks.
        start.Environment["NO_COLOR"] = "1";
        return await ChildProcess.RunAsync(start, line, token) == 0;
    }
}
