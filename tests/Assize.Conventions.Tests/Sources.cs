namespace Assize.Conventions.Tests;

/// <summary>The source files of the checkout.</summary>
static class Sources
{
    /// <summary>Source files below some folders, without what a build leaves behind.</summary>
    public static IReadOnlyList<string> Below(params string[] folders) =>
    [
        .. folders
            .SelectMany(folder => Directory.EnumerateFiles(
                Path.Combine(Testing.Repository.Root, folder), "*.cs", SearchOption.AllDirectories))
            .Where(file => !file.Split(Path.DirectorySeparatorChar).Any(part => part is "obj" or "bin" or "artifacts"))
            .Order(StringComparer.Ordinal),
    ];
}
