namespace Assize.Cli.Tests;

/// <summary>The miniatures of the analyzer's tests, written to a folder as ordinary sources.</summary>
sealed class Miniatures : IDisposable
{
    const string Source = "tests/Assize.Analyzers.Tests/Miniatures";

    public Miniatures()
    {
        foreach (string folder in new[] { "xunit", "nunit", "product" })
        {
            Directory.CreateDirectory(Path.Combine(Folder, folder));
            foreach (string file in Testing.Repository.Files($"{Source}/{folder}", "*.cs.txt"))
                File.WriteAllText(Path.Combine(Folder, folder, file[..^".txt".Length]), Testing.Repository.Read($"{Source}/{folder}/{file}"));
        }
    }

    public string Folder { get; } = Directory.CreateTempSubdirectory("assize-miniatures-").FullName;

    /// <summary>The places at which a table has an answer, as "file:line".</summary>
    public static IReadOnlyList<string[]> Table(string name) =>
    [
        .. Testing.Repository.Read($"{Source}/{name}").Split('\n')
            .Where(line => line.Length > 0 && line[0] != '#')
            .Skip(1)
            .Select(line => line.Split(',')),
    ];

    public void Dispose() => Directory.Delete(Folder, recursive: true);
}
