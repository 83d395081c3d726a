using System.Collections.Concurrent;
using System.Globalization;
using Assize.Analyzers;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Cli;

/// <summary>Reads every test of some sources and judges what was read by every rule.</summary>
static class Inspector
{
    public static Inspected Inspect(Sources sources, Func<Place, bool> isWanted, double? budget, Action<int> progress, CancellationToken token)
    {
        var assertions = new ConcurrentBag<InspectedAssertion>();
        var claims = new ConcurrentBag<InspectedClaim>();
        var failed = new ConcurrentBag<string>();
        int done = 0;
        foreach (var set in sources.Sets)
        {
            Parallel.ForEach(
                set.Tests,
                new ParallelOptions { CancellationToken = token, MaxDegreeOfParallelism = Environment.ProcessorCount },
                tree =>
                {
                    try
                    {
                        Read(tree, set, isWanted, assertions.Add, claims.Add, token);
                    }
                    catch (Exception exception) when (exception is not OperationCanceledException)
                    {
                        // One file that the compiler or a reader stumbles over must not cost the others.
                        failed.Add($"{tree.FilePath} could not be read to its end: {exception.Message}");
                    }

                    progress(Interlocked.Increment(ref done));
                });
        }

        return new Inspected(
            sources.Root,
            sources.ReadFrom,
            [.. sources.Notes.Concat(failed).Distinct().Order(StringComparer.Ordinal)],
            [.. WorstFirst(assertions)],
            [.. claims.Distinct().OrderBy(claim => claim.Place.File, StringComparer.Ordinal).ThenBy(claim => claim.Place.Line)],
            budget);
    }

    // A file in two projects is one file.
    static IEnumerable<InspectedAssertion> WorstFirst(IEnumerable<InspectedAssertion> assertions) => assertions
        .OrderBy(assertion => assertion.IsPinned)
        .ThenByDescending(assertion => assertion.FalseFailure?.Lower ?? 0)
        .ThenByDescending(assertion => assertion.FalseFailure?.Upper ?? 1)
        .ThenBy(assertion => assertion.Place.File, StringComparer.Ordinal)
        .ThenBy(assertion => assertion.Place.Line)
        .ThenBy(assertion => assertion.Place.Column)
        .DistinctBy(assertion => assertion.Place);

    static void Read(
        SyntaxTree tree, SourceSet set, Func<Place, bool> isWanted, Action<InspectedAssertion> assertion, Action<InspectedClaim> claim,
        CancellationToken token)
    {
        var limits = Limits.From(set.Settings.GetOptions(tree));
        foreach (var (reading, framework) in TestReadings.Of(tree, set.Compilation, token))
        {
            var place = PlaceOf(reading.Location, token);
            if (!isWanted(place))
                continue;
            var findings = Findings(reading, limits, set.Compilation);
            if (reading is AssertionReading read)
                assertion(From(read, place, framework, limits, findings));
            else if (reading is ClaimReading made)
                claim(new InspectedClaim(place, Text(made, token), made.Trials, made.Needed, findings));
        }
    }

    static InspectedAssertion From(
        AssertionReading reading, Place place, string framework, Limits limits, IReadOnlyList<InspectedFinding> findings) => new(place)
    {
        Framework = framework,
        Shape = reading.Shape.ToString(),
        Statistic = StatisticNames.Of(reading.Statistic),
        Trials = reading.Trials,
        AcceptedLow = reading.Accepted.Low / Scale(reading),
        AcceptedHigh = reading.Accepted.High / Scale(reading),
        Target = reading.Target,
        Seed = Seed(reading.Seeding),
        FalseFailure = reading.FalseFailure,
        SmallestDefectCaught = reading.DefectCaught(limits.Confidence),
        TrialsNeeded = reading.TrialsNeeded(limits.Risk),
        Theorem = reading.Assessment.Theorem,
        Findings = findings,
    };

    // Counts are shown as shares, the unit of their target.
    static double Scale(AssertionReading reading) => reading.Statistic == Statistic.Proportion ? reading.Trials : 1;

    static string Seed(Seeding seeding) => seeding switch
    {
        Seeding.Inside => "inside the code under test",
        Seeding.TimeBased => "time",
        _ => seeding.ToString().ToLowerInvariant(),
    };

    // Severities and suppressions apply as they would in a build.
    static List<InspectedFinding> Findings(Reading reading, Limits limits, Compilation compilation)
    {
        var judged = RandomizedTests.Rules.Select(rule => rule.Judge(reading, limits)).OfType<Diagnostic>().ToList();
        return judged.Count == 0 ? [] :
        [
            .. CompilationWithAnalyzers.GetEffectiveDiagnostics(judged, compilation)
                .Where(found => !found.IsSuppressed && found.Severity != DiagnosticSeverity.Hidden)
                .OrderBy(found => found.Id, StringComparer.Ordinal)
                .Select(found => new InspectedFinding(found.Id, Level(found.Severity), found.GetMessage(CultureInfo.InvariantCulture))),
        ];
    }

    static string Level(DiagnosticSeverity severity) => severity switch
    {
        DiagnosticSeverity.Error => "error",
        DiagnosticSeverity.Warning => "warning",
        _ => "note",
    };

    static Place PlaceOf(Location location, CancellationToken token)
    {
        var span = location.GetLineSpan();
        var node = location.SourceTree!.GetRoot(token).FindNode(location.SourceSpan);
        var method = node.FirstAncestorOrSelf<MethodDeclarationSyntax>();
        var around = (method ?? node).GetLocation().GetLineSpan();
        return new Place(
            location.SourceTree.FilePath,
            span.StartLinePosition.Line + 1,
            span.StartLinePosition.Character + 1,
            span.EndLinePosition.Line + 1,
            span.EndLinePosition.Character + 1,
            NameOf(method),
            around.StartLinePosition.Line + 1,
            around.EndLinePosition.Line + 1);
    }

    static string NameOf(MethodDeclarationSyntax? method) => method is null ? ""
        : string.Concat(method.Ancestors().OfType<BaseTypeDeclarationSyntax>().Reverse().Select(type => type.Identifier.ValueText + "."))
            + method.Identifier.ValueText;

    static string Text(ClaimReading claim, CancellationToken token)
    {
        var node = claim.Location.SourceTree!.GetRoot(token).FindNode(claim.Location.SourceSpan);
        return node.FirstAncestorOrSelf<StatementSyntax>()?.ToString() ?? node.ToString();
    }
}
