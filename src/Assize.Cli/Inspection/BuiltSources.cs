using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.MSBuild;

namespace Assize.Cli;

/// <summary>Reads a solution or project as its build would compile it, without building it.</summary>
static class BuiltSources
{
    static readonly string[] Solutions = [".sln", ".slnx", ".slnf"];

    public static bool IsSolution(string path) => Solutions.Contains(Path.GetExtension(path), StringComparer.OrdinalIgnoreCase);

    /// <summary>The sources; null with a reason when the projects cannot be loaded or no test framework is resolved in any.</summary>
    public static async Task<(Sources? Sources, string Reason)> ReadAsync(string path, CancellationToken token)
    {
        using var workspace = MSBuildWorkspace.Create();
        var failures = new List<string>();
        using var heard = workspace.RegisterWorkspaceFailedHandler(failure => Hear(failure.Diagnostic, failures));
        try
        {
            if (IsSolution(path))
                await workspace.OpenSolutionAsync(path, cancellationToken: token);
            else
                await workspace.OpenProjectAsync(path, cancellationToken: token);
        }
        catch (Exception exception) when (exception is not OperationCanceledException)
        {
            return (null, exception.Message);
        }

        var sets = new List<SourceSet>();
        bool isRestored = true;
        foreach (var project in workspace.CurrentSolution.Projects
            .Where(project => project.Language == LanguageNames.CSharp && (IsSolution(path) || project.FilePath == path))
            .DistinctBy(project => project.FilePath))
        {
            if (await project.GetCompilationAsync(token) is not { } compilation)
                continue;
            isRestored &= TestReadings.HasFramework(compilation)
                || !compilation.SyntaxTrees.Any(tree => TextGate.HasTests(tree.GetText(token).ToString()));
            if (TestReadings.CanRead(compilation))
                sets.Add(new SourceSet(compilation, [.. compilation.SyntaxTrees], project.AnalyzerOptions.AnalyzerConfigOptionsProvider));
        }

        return isRestored
            ? (new Sources(Path.GetDirectoryName(path)!, "its build", failures, sets), "")
            : (null, failures.Count > 0 ? failures[0] : "a test framework was not resolved; restore the packages to have it read so");
    }

    static void Hear(WorkspaceDiagnostic diagnostic, List<string> failures)
    {
        lock (failures)
        {
            if (diagnostic.Kind == WorkspaceDiagnosticKind.Failure)
                failures.Add(diagnostic.Message);
        }
    }
}
