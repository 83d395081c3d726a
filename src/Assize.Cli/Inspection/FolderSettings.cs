using System.Diagnostics.CodeAnalysis;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Cli;

/// <summary>What the `.editorconfig` files in and above a folder say of a tree: settings and severities.</summary>
sealed class FolderSettings : AnalyzerConfigOptionsProvider
{
    readonly AnalyzerConfigSet _files;

    public FolderSettings(string root)
    {
        var paths = new List<string>();
        for (var folder = new DirectoryInfo(root).Parent; folder is not null; folder = folder.Parent)
            paths.Add(Path.Combine(folder.FullName, ".editorconfig"));
        paths.AddRange(SourceFiles.Below(root, ".editorconfig"));
        _files = AnalyzerConfigSet.Create(
            paths.Where(File.Exists).Select(path => AnalyzerConfig.Parse(File.ReadAllText(path), path)).ToList());
    }

    public override AnalyzerConfigOptions GlobalOptions { get; } =
        new Lines(System.Collections.Immutable.ImmutableDictionary<string, string>.Empty);

    public SyntaxTreeOptionsProvider Severities => new Levels(this);

    public override AnalyzerConfigOptions GetOptions(SyntaxTree tree) =>
        new Lines(_files.GetOptionsForSourcePath(tree.FilePath).AnalyzerOptions);

    public override AnalyzerConfigOptions GetOptions(AdditionalText textFile) => GlobalOptions;

    sealed class Lines(IReadOnlyDictionary<string, string> values) : AnalyzerConfigOptions
    {
        public override bool TryGetValue(string key, [NotNullWhen(true)] out string? value) => values.TryGetValue(key, out value);
    }

    sealed class Levels(FolderSettings settings) : SyntaxTreeOptionsProvider
    {
        public override GeneratedKind IsGenerated(SyntaxTree tree, CancellationToken cancellationToken) => GeneratedKind.Unknown;

        public override bool TryGetDiagnosticValue(
            SyntaxTree tree, string diagnosticId, CancellationToken cancellationToken, out ReportDiagnostic severity) =>
            settings._files.GetOptionsForSourcePath(tree.FilePath).TreeOptions.TryGetValue(diagnosticId, out severity);

        public override bool TryGetGlobalDiagnosticValue(
            string diagnosticId, CancellationToken cancellationToken, out ReportDiagnostic severity)
        {
            severity = ReportDiagnostic.Default;
            return false;
        }
    }
}
