using System.Collections.Immutable;
using System.Text.RegularExpressions;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CodeActions;
using Microsoft.CodeAnalysis.CodeFixes;
using Microsoft.CodeAnalysis.Text;

namespace Assize.Analyzers.Tests;

/// <summary>Statements of a test, with [|…|] around what a rule reports.</summary>
static class Verify
{
    public static readonly ImmutableDictionary<string, string> NoSettings = ImmutableDictionary<string, string>.Empty;

    /// <summary>The rule reports exactly what is marked; other rules may say what they like.</summary>
    public static async Task Rule(string id, string marked, IReadOnlyDictionary<string, string>? settings = null)
    {
        var (source, spans) = Parse(InTest(marked));
        var found = await Found(id, source, settings);
        Assert.True(
            spans.SequenceEqual(found.Select(diagnostic => diagnostic.Location.SourceSpan)),
            $"Expected [{string.Join(", ", spans)}], found:\n{string.Join('\n', found)}\nin\n{source}");
    }

    /// <summary>No rule says anything, and the statements compile.</summary>
    public static async Task Silent(string statements, string? attributes = null, string parameters = "")
    {
        var compilation = Workbench.Compile(InTest(statements, attributes, parameters));
        Assert.Empty(
            compilation.GetDiagnostics(TestContext.Current.CancellationToken).Where(
            found => found.Severity == DiagnosticSeverity.Error));
        Assert.Empty(await Workbench.Analyze(compilation));
    }

    /// <summary>The one reading of some statements.</summary>
    public static AssertionReading Reading(string statements, string? attributes = null, string parameters = "")
    {
        var compilation = Workbench.Compile(InTest(statements, attributes, parameters));
        Assert.Empty(
            compilation.GetDiagnostics(TestContext.Current.CancellationToken).Where(
            found => found.Severity == DiagnosticSeverity.Error));
        return Assert.Single(Workbench.Readings(compilation));
    }

    public static async Task<string> Message(
        string id, string statements, IReadOnlyDictionary<string, string>? settings = null)
    {
        var diagnostic = Assert.Single(await Found(id, InTest(statements), settings));
        return diagnostic.GetMessage(System.Globalization.CultureInfo.InvariantCulture);
    }

    /// <summary>The fix turns one text into the other, and what it was offered for is gone.</summary>
    public static async Task Fix(string id, string before, string after)
    {
        var (document, diagnostics) = await Prepared(id, InTest(before));
        var action = Assert.Single(await Actions(document, Assert.Single(diagnostics)));
        var operation = (await action.GetOperationsAsync(TestContext.Current.CancellationToken))
            .OfType<ApplyChangesOperation>().Single();
        string changed = await Text(operation.ChangedSolution.GetDocument(document.Id)!);
        Assert.Equal(InTest(after), changed);
        Assert.Empty(await Found(id, changed, null));
    }

    public static async Task NoFix(string id, string statements)
    {
        var (document, diagnostics) = await Prepared(id, InTest(statements));
        Assert.NotEmpty(diagnostics);
        foreach (Diagnostic diagnostic in diagnostics)
            Assert.Empty(await Actions(document, diagnostic));
    }

    /// <summary>Fix-all over a scope of a solution with the same tests in two documents of two projects each.</summary>
    public static async Task<int> Left(string id, string statements, FixAllScope scope)
    {
        var workspace = new AdhocWorkspace();
        Solution solution = workspace.CurrentSolution;
        foreach (string name in new[] { "One", "Two" })
        {
            solution = With(solution, name, out ProjectId project);
            foreach (string file in new[] { "A.cs", "B.cs" })
                solution = solution.AddDocument(
                    DocumentId.CreateNewId(project), file, InTest(statements)
                    .Replace("class Tests", "class " + file[..1], StringComparison.Ordinal));
        }

        var first = solution.Projects.First().Documents.First();
        var context = new FixAllContext(
            first, new RaiseTrialsFix(), scope, nameof(RaiseTrialsFix), [id], new Source(id),
                TestContext.Current.CancellationToken);
        var action = await new RaiseTrialsFix().GetFixAllProvider().GetFixAsync(context);
        var changed = (await action!.GetOperationsAsync(TestContext.Current.CancellationToken))
            .OfType<ApplyChangesOperation>().Single().ChangedSolution;
        int left = 0;
        foreach (Document document in changed.Projects.SelectMany(project => project.Documents))
            left += (await Found(id, await Text(document), null)).Count;
        return left;
    }

    public static string InTest(string statements, string? attributes = null, string parameters = "") =>
        statements.Contains("class ", StringComparison.Ordinal)
        ? statements
        : $$"""
        using System;
        using System.Linq;
        using System.Collections.Generic;
        using System.Threading.Tasks;
        using Orchard;
        {{(IsNUnit(statements) ? "using NUnit.Framework;\nusing NUnit.Framework.Legacy;" : "using Xunit;\nusing Assize;")}}
        public class Tests
        {
            const int Trees = 100;
            readonly Random own = new Random();
            {{attributes ?? (IsNUnit(statements) ? "[Test]" : "[Fact]")}}
            public {{(statements.Contains("await ", StringComparison.Ordinal) ? "async Task" : "void")}} It({{parameters}})
            {
        {{statements}}
            }
        }
        """;

    static bool IsNUnit(string statements) => Regex.IsMatch(statements, @"Assert\.That|ClassicAssert");

    static (string Source, List<TextSpan> Spans) Parse(string marked)
    {
        var spans = new List<TextSpan>();
        string source = marked;
        for (int start = source.IndexOf("[|", StringComparison.Ordinal); start >= 0; start = source.IndexOf(
            "[|", StringComparison.Ordinal))
        {
            int end = source.IndexOf("|]", StringComparison.Ordinal) - 2;
            source = source.Remove(end + 2, 2).Remove(start, 2);
            spans.Add(TextSpan.FromBounds(start, end));
        }

        return (source, spans);
    }

    static async Task<List<Diagnostic>> Found(string id, string source, IReadOnlyDictionary<string, string>? settings)
    {
        var compilation = Workbench.Compile(source);
        Assert.Empty(
            compilation.GetDiagnostics(TestContext.Current.CancellationToken).Where(
            found => found.Severity == DiagnosticSeverity.Error));
        return [.. (await Workbench.Analyze(compilation, settings)).Where(found => found.Id == id).OrderBy(
            found => found.Location.SourceSpan.Start)];
    }

    static async Task<(Document Document, List<Diagnostic> Diagnostics)> Prepared(string id, string source)
    {
        var solution = With(new AdhocWorkspace().CurrentSolution, "Tests", out ProjectId project);
        var document = solution.AddDocument(DocumentId.CreateNewId(project), "Test.cs", source).Projects.Single()
            .Documents.Single();
        return (document, await new Source(id).In(document));
    }

    static Solution With(Solution solution, string name, out ProjectId project)
    {
        project = ProjectId.CreateNewId();
        return solution.AddProject(ProjectInfo.Create(
            project, VersionStamp.Default, name, name, LanguageNames.CSharp, parseOptions: Workbench.Language,
            compilationOptions: Workbench.Compile("").Options,
                metadataReferences: Workbench.References(Workbench.Orchard)));
    }

    static async Task<List<CodeAction>> Actions(Document document, Diagnostic diagnostic)
    {
        var actions = new List<CodeAction>();
        await new RaiseTrialsFix().RegisterCodeFixesAsync(
            new CodeFixContext(
                document, diagnostic, (action, _) => actions.Add(action), TestContext.Current.CancellationToken));
        return actions;
    }

    static async Task<string> Text(Document document) =>
        (await document.GetTextAsync(TestContext.Current.CancellationToken)).ToString();

    sealed class Source(string id) : FixAllContext.DiagnosticProvider
    {
        public async Task<List<Diagnostic>> In(Document document) =>
            [.. (await GetAllDiagnosticsAsync(document.Project, TestContext.Current.CancellationToken))
                .Where(found => found.Location.SourceTree?.FilePath == document.FilePath
                    || document.Project.DocumentIds.Count == 1)];

        public override async Task<IEnumerable<Diagnostic>> GetAllDiagnosticsAsync(
            Project project, CancellationToken cancellationToken) =>
            (await Workbench.Analyze((await project.GetCompilationAsync(cancellationToken))!)).Where(
                found => found.Id == id);

        public override async Task<IEnumerable<Diagnostic>> GetDocumentDiagnosticsAsync(
            Document document, CancellationToken cancellationToken)
        {
            var tree = await document.GetSyntaxTreeAsync(cancellationToken);
            return (await GetAllDiagnosticsAsync(document.Project, cancellationToken)).Where(
                found => found.Location.SourceTree == tree);
        }

        public override Task<IEnumerable<Diagnostic>> GetProjectDiagnosticsAsync(
            Project project, CancellationToken cancellationToken) =>
            Task.FromResult<IEnumerable<Diagnostic>>([]);
    }
}
