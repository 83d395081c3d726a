using System.Globalization;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace Assize.Analyzers.Tests;

public class MiniatureTests(ITestOutputHelper output)
{
    const double WidestEnclosure = 0.01;

    static readonly string Product = Repository.Read(
        "tests", "Assize.Analyzers.Tests", "Miniatures", "product", "Products.cs.txt");

    [Fact]
    public void Every_count_of_one_method_is_read_with_its_number()
    {
        var readings = ReadAll().ToDictionary(reading => Key(reading.Location));
        var answers = Repository.Table("tests", "Assize.Analyzers.Tests", "Miniatures", "answers.csv");
        var missed = answers.Where(row => !readings.TryGetValue(Key(row), out var reading) || !Agrees(row, reading))
            .ToList();
        foreach (var row in missed)
            output.WriteLine($"{Key(row)}: {(readings.TryGetValue(Key(row), out var wrong) ? wrong : "not read")}");
        output.WriteLine($"{answers.Count - missed.Count} of {answers.Count} answers agree");

        Assert.Equal(15, answers.Count);
        Assert.Empty(missed);
    }

    [Fact]
    public async Task No_look_alike_is_read_or_reported()
    {
        var silent = Repository.Table("tests", "Assize.Analyzers.Tests", "Miniatures", "silent.csv").Select(Key)
            .ToHashSet();
        var reported = (await Workbench.Analyze(Compilation())).Select(diagnostic => Key(diagnostic.Location));
        var wrong = ReadAll().Where(reading => reading.FalseFailure.Upper > 0).Select(reading => Key(reading.Location))
            .Concat(reported).Where(silent.Contains).ToList();
        output.WriteLine($"{silent.Count - wrong.Count} of {silent.Count} look-alikes are silent");

        Assert.Equal(56, silent.Count);
        Assert.Empty(wrong);
    }

    [Fact]
    public void Whatever_else_is_read_agrees_with_its_number()
    {
        var expected = Repository.Table("tests", "Assize.Analyzers.Tests", "Miniatures", "answers.csv").Select(Key)
            .Concat(Repository.Table("tests", "Assize.Analyzers.Tests", "Miniatures", "silent.csv").Select(Key))
                .ToHashSet();
        var elsewhere = Repository.Table("tests", "Assize.Analyzers.Tests", "Miniatures", "elsewhere.csv")
            .ToDictionary(Key);
        var others = ReadAll().Where(reading => !expected.Contains(Key(reading.Location))).ToList();
        foreach (var reading in others)
            output.WriteLine($"{Key(reading.Location)} {reading}");

        Assert.All(others, reading => Assert.True(Holds(elsewhere[Key(reading.Location)], reading)));
    }

    [Fact]
    public async Task The_rules_report_what_they_should()
    {
        var reported = (await Workbench.Analyze(Compilation())).Select(
            diagnostic => (Key(diagnostic.Location), diagnostic.Id)).ToHashSet();
        var answers = Repository.Table("tests", "Assize.Analyzers.Tests", "Miniatures", "answers.csv");
        var wrong = answers
            .Where(row =>
                row["expected_rules"].Split(' ').Contains("ASZ2001") != reported.Contains((Key(row), "ASZ2001")));

        Assert.Equal(12, answers.Count(row => row["expected_rules"].Contains("ASZ2001", StringComparison.Ordinal)));
        Assert.Empty(wrong.Select(Key));
    }

    static bool Agrees(Dictionary<string, string> row, AssertionReading reading) =>
        reading.Trials == Number(row["trials"])
        && reading.Accepted.Low == Number(row["accepted_low"])
        && reading.Accepted.High == Number(row["accepted_high"])
        && Holds(row, reading)
        && AgreesOnTrials(row["trials_needed_1e-6"], reading)
        && AgreesOnDefect(row, reading);

    // The table prints six digits.
    static bool Holds(Dictionary<string, string> row, AssertionReading reading)
    {
        double truth = Number(row["false_failure"]);
        return reading.FalseFailure.Lower <= truth * (1 + 1e-5) && reading.FalseFailure.Upper >= truth * (1 - 1e-5)
            && reading.FalseFailure.Upper <= reading.FalseFailure.Lower * (1 + WidestEnclosure);
    }

    // Never too few; a share on a rim may cost one step of the count more.
    static bool AgreesOnTrials(string needed, AssertionReading reading) =>
        needed == "never" ? reading.TrialsNeeded(1e-6) is null
        : reading.TrialsNeeded(1e-6) is { } trials && trials >= Number(needed)
            && trials <= (Number(needed) * 1.02) + 60;

    // The table speaks of whole runs; where both directions are as near, either sign is right.
    static bool AgreesOnDefect(Dictionary<string, string> row, AssertionReading reading) =>
        reading.Runs != Runs.Once
        || (reading.DefectCaught(0.999) is { } defect
            && Math.Abs(Math.Abs(defect) - Math.Abs(
                Number(row["smallest_defect_caught_99.9"]))) < 1e-5);

    static IEnumerable<AssertionReading> ReadAll() => Workbench.Readings(Compilation());

    static CSharpCompilation Compilation()
    {
        string root = Repository.Path("tests", "Assize.Analyzers.Tests", "Miniatures");
        return Workbench.Compile(
            new[] { "xunit", "nunit" }.SelectMany(folder => Directory.GetFiles(Path.Combine(root, folder), "*.cs.txt"))
                .Order(StringComparer.Ordinal)
                .Select(path => CSharpSyntaxTree.ParseText(File.ReadAllText(path), Workbench.Language, path)),
            Product);
    }

    static string Key(Dictionary<string, string> row) => row["file"] + ":" + row["line"];

    static string Key(Location location)
    {
        string[] parts = location.SourceTree!.FilePath.Split(Path.DirectorySeparatorChar);
        return $"{parts[^2]}/{Path.GetFileNameWithoutExtension(parts[^1])}:{location.GetLineSpan().StartLinePosition.Line + 1}";
    }

    static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
