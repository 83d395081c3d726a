using System.Globalization;

namespace Assize.Benchmarks;

/// <summary>What the analyzer adds to a build.</summary>
sealed class AnalyzerCost : Benchmark
{
    const int Tests = 2_000;
    const int StatisticalEvery = 10;
    const int WarmUps = 6;
    const int Repetitions = 8;

    public override string Title =>
        $"{Tests} test methods, 1 in {StatisticalEvery} statistical; less an analyzer that asks for the same and does nothing";

    public override IEnumerable<Row> Measure()
    {
        var mixed = AnalyzerTimes.Parse(GeneratedSuite.Files(Tests, StatisticalEvery));
        var plain = AnalyzerTimes.Parse(GeneratedSuite.Files(Tests, null));
        AnalyzerTimes.Of(mixed, WarmUps);
        AnalyzerTimes.Of(plain, WarmUps);
        var (ofMixed, ofPlain) = (AnalyzerTimes.Of(mixed, Repetitions), AnalyzerTimes.Of(plain, Repetitions));

        double ordinary = (ofPlain.Assize - ofPlain.Nothing) / Tests;
        int statistical = Tests / StatisticalEvery;
        double each = (ofMixed.Assize - ofMixed.Nothing - ordinary * (Tests - statistical)) / statistical;
        yield return Microseconds("an ordinary test", ordinary, 20);
        yield return Microseconds("a statistical test", each, 1000) with { Note = $"{ofMixed.Findings} findings" };
        yield return Against("mixed suite : xunit.analyzers", ofMixed);
        yield return Against("ordinary suite : xunit.analyzers", ofPlain);
    }

    static Row Microseconds(string name, double seconds, double limit) =>
        new(name, seconds * 1e6, seconds * 1e6, limit, "") { Unit = " µs" };

    static Row Against(string name, AnalyzerTimes times)
    {
        double ratio = times.Assize / times.Xunit;
        return new Row(name, ratio, ratio, 0.5, string.Create(CultureInfo.InvariantCulture,
            $"{Row.Time(times.Assize)} : {Row.Time(times.Xunit)}, nothing {Row.Time(times.Nothing)}"));
    }
}
