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
    readonly string _framework;
    readonly string _method;

    public Subject(
        Writes writes, RandomTypes types, Evaluator evaluator, DataRow? row, Runs runs, string framework, string method)
    {
        _laws = new LawReader(evaluator, new DrawReader(writes, types), types);
        _seeds = new SeedReader(writes, types);
        (_row, _runs, _framework, _method) = (row, runs, framework, method);
    }

    public AssertionReading? Read(Requirement requirement)
    {
        if (BandReader.Read(requirement) is not { } band || _laws.Read(band) is not { } rate)
            return null;
        // Draws made by the framework's repeats and by loops around the assertion are both fresh.
        var runs = new Runs(_runs.Repeats * requirement.Repeats, _runs.Tries);
        if (runs is { Repeats: > 1, Tries: > 1 })
            return null;
        var shares = new ProportionBand(band.Shares.Low, band.Shares.High);
        if (Question.AskFor(
            () => new ProportionAssessment(band.Count.Passes, band.Low, band.High, shares, rate.Value)) is not { } assessment
            || Question.AskFor(() => assessment.FalseFailure) is null)
            return null;
        return new AssertionReading(requirement.Site.Syntax.GetLocation(), TrialsLiteral(band))
        {
            Statistic = Statistic.Proportion,
            Shape = 'B',
            Assessment = assessment,
            Trials = band.Count.Passes,
            Accepted = new Bounds.Band(band.Low, band.High),
            Meant = new Bounds.Band(band.Shares.Low, band.Shares.High, band.Shares.LowIn, band.Shares.HighIn),
            Target = rate.Value,
            Basis = rate.Basis,
            Tolerance = band.Tolerance,
            MoreTrialsHelp = !requirement.TookRoot,
            Runs = runs,
            Seeding = SeedingOf(band),
            Framework = _framework,
            Method = _method,
            Row = _row?.ToString(),
        };
    }

    Seeding SeedingOf(CountBand band) => ((Term.If)band.Count.Each).Condition.Parts().OfType<Term.Draw>()
        .Select(draw => _seeds.Read(draw.Code))
        .DefaultIfEmpty(Seeding.Unclear)
        .Max();

    static Location? TrialsLiteral(CountBand band) => band.Count.Loops.Items is { Length: 1 } loops
        && TrialCountReader.Bound(loops[0]) is { } bound
        ? LiteralReader.Of(bound)
        : null;
}
