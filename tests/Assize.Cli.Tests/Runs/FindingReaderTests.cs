namespace Assize.Cli.Tests.Runs;

public class FindingReaderTests
{
    [Fact]
    public void Findings_of_other_analyzers_and_suppressed_ones_are_left_out_and_doubles_count_once()
    {
        string folder = Directory.CreateTempSubdirectory("assize-findings-").FullName;
        File.WriteAllText(Path.Combine(folder, "one.sarif"), Log(
            Result("ASZ2001", "warning", "red", 12), Result("ASZ2001", "warning", "red", 12), Result("CA1000", "warning", "other", 1),
            Result("ASZ2002", "note", "maybe", 7), Result("ASZ1001", "warning", "quiet", 3, """, "suppressions": [{ "kind": "inSource" }]""")));

        var findings = FindingReader.Read(folder);

        Assert.Equal([("ASZ2002", 7, false), ("ASZ2001", 12, true)], findings.Select(finding => (finding.Rule, finding.Line, finding.Stands)));
        Assert.All(findings, finding => Assert.Equal("/src/A Test.cs", finding.File));
        Directory.Delete(folder, recursive: true);
    }

    static string Log(params string[] results) =>
        $$"""{ "version": "2.1.0", "runs": [ { "results": [ {{string.Join(",", results)}} ] } ] }""";

    static string Result(string rule, string level, string text, int line, string more = "") => $$"""
        { "ruleId": "{{rule}}", "level": "{{level}}", "message": { "text": "{{text}}" }, "locations": [ { "physicalLocation": {
          "artifactLocation": { "uri": "file:///src/A%20Test.cs" }, "region": { "startLine": {{line}} } } } ]{{more}} }
        """;
}
