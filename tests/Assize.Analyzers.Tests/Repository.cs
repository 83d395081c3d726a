using System.Reflection;

namespace Assize.Analyzers.Tests;

/// <summary>Files of the working tree, found through the path the build wrote into this assembly.</summary>
static class Repository
{
    static readonly string Root = typeof(Repository).Assembly.GetCustomAttributes<AssemblyMetadataAttribute>()
        .Single(metadata => metadata.Key == "RepositoryRoot").Value!;

    public static string Path(params string[] parts) => System.IO.Path.Combine([Root, .. parts]);

    public static string Read(params string[] parts) => File.ReadAllText(Path(parts));

    /// <summary>A table with '#' lines of provenance, a header, and quoted fields; each row by column name.</summary>
    public static List<Dictionary<string, string>> Table(params string[] parts)
    {
        var lines = File.ReadAllLines(Path(parts)).Where(line => !line.StartsWith('#')).Select(Fields).ToList();
        return [.. lines.Skip(1).Select(
            fields => lines[0].Zip(fields).ToDictionary(pair => pair.First, pair => pair.Second))];
    }

    static List<string> Fields(string line)
    {
        var fields = new List<string> { "" };
        bool quoted = false;
        foreach (char character in line)
        {
            if (character == '"')
                quoted = !quoted;
            else if (character == ',' && !quoted)
                fields.Add("");
            else
                fields[^1] += character;
        }

        return fields;
    }
}
