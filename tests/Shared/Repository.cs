using System.Reflection;

namespace Assize.Testing;

/// <summary>Files of the repository that tests compare with the code.</summary>
static class Repository
{
    // Set to 1 to let the tests rewrite the files instead of comparing them; read the difference before you commit it.
    const string Rewrite = "ASSIZE_REWRITE";

    public static string Root { get; } = Assembly.GetExecutingAssembly()
        .GetCustomAttributes<AssemblyMetadataAttribute>().Single(item => item.Key == "RepositoryRoot").Value!;

    public static string Read(string path) => File.ReadAllText(Path.Combine(Root, path)).ReplaceLineEndings("\n");

    public static string[] Files(string folder, string pattern) =>
        [.. Directory.GetFiles(Path.Combine(Root, folder), pattern).Select(Path.GetFileName).Order(StringComparer.Ordinal)!];

    public static void MustEqual(string path, string actual)
    {
        string full = Path.Combine(Root, path);
        if (Environment.GetEnvironmentVariable(Rewrite) == "1")
            File.WriteAllText(full, actual);

        Assert.True(File.Exists(full), $"{path} does not exist; run the tests with {Rewrite}=1 to write it.");
        Assert.True(
            Read(path) == actual,
            $"{path} differs from the code; run the tests with {Rewrite}=1 and read the difference.\n{actual}");
    }

    /// <summary>Compares, or rewrites, the lines between two markers of a page.</summary>
    public static void MustContain(string path, string section, string actual)
    {
        string page = Read(path);
        string opening = $"<!-- {section} -->\n";
        string closing = $"<!-- /{section} -->";
        int start = page.IndexOf(opening, StringComparison.Ordinal);
        int end = page.IndexOf(closing, StringComparison.Ordinal);
        Assert.True(start >= 0 && end > start, $"{path} has no section marked {opening.Trim()} … {closing}.");
        MustEqual(path, page[..(start + opening.Length)] + actual + page[end..]);
    }
}
