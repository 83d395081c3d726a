namespace Assize.Cli;

/// <summary>Files below a folder, without what builds and tools leave behind. Links are not followed.</summary>
static class SourceFiles
{
    static readonly EnumerationOptions Here = new()
    {
        AttributesToSkip = FileAttributes.ReparsePoint,
        IgnoreInaccessible = true,
        MatchType = MatchType.Simple,
    };

    /// <summary>Full paths of the files whose names end so, in an order that does not depend on the disk.</summary>
    public static IReadOnlyList<string> Below(string folder, string ending)
    {
        var found = new List<string>();
        Collect(folder, ending, found);
        found.Sort(StringComparer.Ordinal);
        return found;
    }

    static void Collect(string folder, string ending, List<string> found)
    {
        found.AddRange(Directory.EnumerateFiles(folder, "*", Here).Where(file => file.EndsWith(ending, StringComparison.OrdinalIgnoreCase)));
        foreach (string inner in Directory.EnumerateDirectories(folder, "*", Here))
        {
            string name = Path.GetFileName(inner);
            if (name is not ("bin" or "obj" or "node_modules") && !name.StartsWith('.'))
                Collect(inner, ending, found);
        }
    }
}
