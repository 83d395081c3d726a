using System.Reflection;

namespace Assize.Conventions.Tests;

/// <summary>The checkout the tests were built from.</summary>
static class Repository
{
    public static string Root { get; } = typeof(Repository).Assembly
        .GetCustomAttributes<AssemblyMetadataAttribute>().Single(entry => entry.Key == "RepositoryRoot").Value!;

    public static string Read(string path) => File.ReadAllText(Path.Combine(Root, path));

    /// <summary>Source files below some folders, without what a build leaves behind.</summary>
    public static IReadOnlyList<string> Sources(params string[] folders) =>
    [
        .. folders
            .SelectMany(folder => Directory.EnumerateFiles(Path.Combine(Root, folder), "*.cs", SearchOption.AllDirectories))
            .Where(file => !file.Split(Path.DirectorySeparatorChar).Any(part => part is "obj" or "bin" or "artifacts"))
            .Order(StringComparer.Ordinal),
    ];
}
