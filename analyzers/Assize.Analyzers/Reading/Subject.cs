using Assize.Bounds;
using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>From one requirement to one reading: band, law, seed and the answer of the core.</summary>
sealed class Subject
{
    readonly LawReader _laws;
    readonly SeedReader _seeds;
    readonly DataRow? _row;
    readonly Runs _runs;

    public Subject(Writes writes, RandomTypes types, Evaluator evaluator, DataRow? row, Runs runs)
    {
        _laws = new LawReader(evaluator, new DrawReader(writes, types), types);
        _seeds = new SeedReader(writes, types);
        (_row, _runs) = (row, runs);
    }

    public AssertionReading? Read(Requirement requirement)
    {
        if (BandReader.Read(requirement) is not { } band || _laws.Read(band) is not { } rate)
            return null;
        // Draws made by the framework's repeats and by loops around the assertion are both fresh.
        var runs = new Runs(_runs.Repeats * requirement.Repeats, _runs.Tries);
        if (runs is { Repeats: > 1, Tries: > 1 })
            return null;
        if (Question.AskFor(
            () => ProportionAssessment.Assess(band.Count.Passes, band.Low, band.High, rate.Value)) is not { } once)
            return null;
        return new AssertionReading(requirement.Site.Syntax.GetLocation(), TrialsLiteral(band))
        {
            Trials = band.Count.Passes,
            AcceptLow = band.Low,
            AcceptHigh = band.High,
            Shares = new ProportionBand(band.Shares.Low, band.Shares.High),
            MoreTrialsHelp = !requirement.TookRoot,
            Rate = rate,
            Tolerance = band.Tolerance,
            Runs = runs,
            Seeding = SeedingOf(band),
            Row = _row?.ToString(),
            FalseFailure = Chance.OfRun(once, runs),
        };
    }

    Seeding SeedingOf(Band band) => ((Term.If)band.Count.Each).Condition.Parts().OfType<Term.Draw>()
        .Select(draw => _seeds.Read(draw.Code))
        .DefaultIfEmpty(Seeding.Unclear)
        .Max();

    static Location? TrialsLiteral(Band band) => band.Count.Loops.Items is { Length: 1 } loops
        && TrialCountReader.Bound(loops[0]) is { } bound
        ? LiteralReader.Of(bound)
        : null;
}
