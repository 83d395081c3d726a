using System.Text.Json;

namespace Assize.Cli;

/// <summary>A project whose tests are run: where its assembly is and which of the two platforms runs it.</summary>
sealed record TestProject(string File, string Assembly, bool RunsItself)
{
    /// <summary>The project files that a path given by the user means.</summary>
    public static IEnumerable<string> Files(string path, string folder)
    {
        string full = Path.GetFullPath(path, folder);
        if (System.IO.File.Exists(full))
            return [full];
        if (!Directory.Exists(full))
            throw new CouldNotRunException($"'{path}' does not exist. Give a test project or the folder it is in.");

        string[] found = Directory.GetFiles(full, "*.csproj");
        return found.Length == 1 ? found : throw new CouldNotRunException(
            $"'{path}' holds {found.Length} project files. Give the test project itself.");
    }

    /// <summary>Asks MSBuild about a project that has been built, one answer for each of its target frameworks.</summary>
    public static async Task<IReadOnlyList<TestProject>> AskAsync(string file, string configuration, CancellationToken token)
    {
        using var whole = await PropertiesAsync(file, configuration, framework: null, token);
        string[] frameworks = Property(whole, "TargetFrameworks").Split(';', StringSplitOptions.RemoveEmptyEntries);
        if (frameworks.Length == 0)
            return [From(file, whole)];

        var answers = new List<TestProject>();
        foreach (string framework in frameworks)
        {
            using var one = await PropertiesAsync(file, configuration, framework, token);
            answers.Add(From(file, one));
        }

        return answers;
    }

    static TestProject From(string file, JsonDocument properties) => new(
        file,
        Property(properties, "TargetPath"),
        string.Equals(Property(properties, "IsTestingPlatformApplication"), "true", StringComparison.OrdinalIgnoreCase));

    static string Property(JsonDocument properties, string name) =>
        properties.RootElement.GetProperty("Properties").GetProperty(name).GetString() ?? "";

    static async Task<JsonDocument> PropertiesAsync(string file, string configuration, string? framework, CancellationToken token)
    {
        var lines = new List<string>();
        string[] arguments =
        [
            "msbuild", file, "-nologo", $"-p:Configuration={configuration}",
            .. framework is null ? (string[])[] : [$"-p:TargetFramework={framework}"],
            "-getProperty:TargetPath", "-getProperty:TargetFrameworks", "-getProperty:IsTestingPlatformApplication",
        ];
        int exit = await ChildProcess.RunAsync(
            ChildProcess.Dotnet(Path.GetDirectoryName(file)!, arguments), lines.Add, token);
        string answer = string.Join('\n', lines);
        return exit == 0
            ? JsonDocument.Parse(answer)
            : throw new CouldNotRunException($"{file} could not be read as a project:\n{answer}");
    }
}
