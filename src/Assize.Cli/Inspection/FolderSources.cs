using System.Collections.Concurrent;
using System.Text;
using System.Text.RegularExpressions;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;
using Microsoft.CodeAnalysis.Text;

namespace Assize.Cli;

/// <summary>
/// Reads a folder without building it: tests, and the files that declare what they name, one compilation for each
/// project file.
/// </summary>
sealed partial class FolderSources
{
    // A name declared in more files than this is no help: nothing tells which one is meant.
    const int MostHomes = 12;

    // How far names are followed: from a test to the code under test, its bases and what it returns.
    const int Steps = 3;

    // Generated tables of this size hold no tests.
    const long MostBytes = 8_000_000;

    static readonly CSharpParseOptions Language = CSharpParseOptions.Default
        .WithLanguageVersion(LanguageVersion.Preview)
        .WithPreprocessorSymbols("NET", "NETCOREAPP", "NET5_0_OR_GREATER", "NET6_0_OR_GREATER", "NET7_0_OR_GREATER",
            "NET8_0_OR_GREATER", "NET9_0_OR_GREATER", "NET10_0_OR_GREATER", "NET10_0");

    readonly string _root;
    readonly FolderSettings _settings;
    readonly Dictionary<string, TextGate> _files;
    readonly Dictionary<string, List<string>> _homes = new(StringComparer.Ordinal);
    readonly CancellationToken _token;

    FolderSources(string root, List<string> notes, CancellationToken token)
    {
        (_root, _token) = (root, token);
        _settings = new FolderSettings(root);
        var gates = new ConcurrentDictionary<string, TextGate>();
        Parallel.ForEach(
            SourceFiles.Below(root, ".cs"),
            new ParallelOptions { CancellationToken = token, MaxDegreeOfParallelism = Environment.ProcessorCount },
            file => Gate(file, gates, notes));
        _files = new Dictionary<string, TextGate>(gates);
        foreach (string file in _files.Keys.Order(StringComparer.Ordinal))
        {
            foreach (string name in _files[file].Declared)
                (_homes.TryGetValue(name, out var homes) ? homes : _homes[name] = []).Add(file);
        }
    }

    public static Sources Read(string root, string why, CancellationToken token)
    {
        var notes = new List<string>();
        var folder = new FolderSources(root, notes, token);
        string how = $"plain sources{why}, bound against the .NET 10 reference assemblies and signatures of "
            + string.Join(", ", FrameworkSignatures.Names());
        return new Sources(root, how, notes, folder.Sets());
    }

    IEnumerable<SourceSet> Sets() => _files
        .Where(file => file.Value.MayHoldTests)
        .Select(file => file.Key)
        .GroupBy(file => ProjectFolder(Path.GetDirectoryName(file)!))
        .OrderBy(group => group.Key, StringComparer.Ordinal)
        .Select(group => Set(group.Key, [.. group]));

    SourceSet Set(string project, HashSet<string> tests)
    {
        var trees = Closure(project, tests).AsParallel().AsOrdered().WithCancellation(_token).Select(Tree).ToList();
        var compilation = CSharpCompilation.Create(
            "Inspected",
            trees.Append(CSharpSyntaxTree.ParseText(Usings(project), Language)),
            FrameworkSignatures.References,
            new CSharpCompilationOptions(
                OutputKind.DynamicallyLinkedLibrary, allowUnsafe: true, nullableContextOptions: NullableContextOptions.Enable)
                .WithSyntaxTreeOptionsProvider(_settings.Severities));
        return new SourceSet(compilation, [.. trees.Where(tree => tests.Contains(tree.FilePath))], _settings);
    }

    List<string> Closure(string project, HashSet<string> tests)
    {
        var taken = new HashSet<string>(tests);
        taken.UnionWith(_files.Where(file => file.Value.IsShared && ProjectFolder(Path.GetDirectoryName(file.Key)!) == project)
            .Select(file => file.Key));
        var names = new HashSet<string>(StringComparer.Ordinal);
        var latest = tests;
        for (int step = 0; step < Steps && latest.Count > 0; step++)
            latest = [.. latest.SelectMany(file => Named(file, names, project)).Where(taken.Add)];
        return [.. taken.Order(StringComparer.Ordinal)];
    }

    // The files that declare what a file names, its own project before all others.
    List<string> Named(string file, HashSet<string> names, string project)
    {
        _token.ThrowIfCancellationRequested();
        var found = new List<string>();
        var known = names.GetAlternateLookup<ReadOnlySpan<char>>();
        var homes = _homes.GetAlternateLookup<ReadOnlySpan<char>>();
        TextGate.Identifiers(File.ReadAllText(file), name =>
        {
            if (!homes.TryGetValue(name, out var all) || !known.Add(name))
                return;
            var own = all.Where(home => home.StartsWith(project + Path.DirectorySeparatorChar, StringComparison.Ordinal)).ToList();
            var chosen = own.Count > 0 ? own : all;
            if (chosen.Count <= MostHomes)
                found.AddRange(chosen);
        });
        return found;
    }

    static SyntaxTree Tree(string file)
    {
        using var stream = File.OpenRead(file);
        return CSharpSyntaxTree.ParseText(SourceText.From(stream, Encoding.UTF8), Language, file);
    }

    static void Gate(string file, ConcurrentDictionary<string, TextGate> gates, List<string> notes)
    {
        try
        {
            if (new FileInfo(file).Length <= MostBytes)
                gates[file] = TextGate.Of(File.ReadAllText(file));
            else
                Note($"{file} is larger than {Numbers.Text(MostBytes)} bytes and was left out.");
        }
        catch (Exception exception) when (exception is IOException or UnauthorizedAccessException)
        {
            Note($"{file} could not be read and was left out: {exception.Message}");
        }

        void Note(string text)
        {
            lock (notes)
                notes.Add(text);
        }
    }

    // The nearest folder up to the root that holds a project file.
    string ProjectFolder(string folder)
    {
        for (string? at = folder; at is not null && at.Length > _root.Length; at = Path.GetDirectoryName(at))
        {
            if (Directory.EnumerateFiles(at, "*.csproj").Any())
                return at;
        }

        return _root;
    }

    // The usual implicit usings, and what the project's own files add to them.
    static string Usings(string project)
    {
        var names = new SortedSet<string>(StringComparer.Ordinal)
        {
            "System", "System.Collections.Generic", "System.IO", "System.Linq", "System.Net.Http", "System.Threading",
            "System.Threading.Tasks",
        };
        for (string? at = project; at is not null; at = Path.GetDirectoryName(at))
        {
            foreach (string file in Directory.EnumerateFiles(at).Where(IsProjectFile))
                names.UnionWith(Using().Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value));
        }

        return string.Concat(names.Select(name => $"global using global::{name};\n"));
    }

    static bool IsProjectFile(string file) =>
        file.EndsWith(".csproj", StringComparison.OrdinalIgnoreCase)
        || Path.GetFileName(file) is "Directory.Build.props" or "Directory.Build.targets";

    [GeneratedRegex("""<Using\s+Include="([\w.]+)"\s*/?>""")]
    private static partial Regex Using();
}
