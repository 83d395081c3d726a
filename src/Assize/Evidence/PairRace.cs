using Assize.Bounds;

namespace Assize;

/// <summary>A race about the standard deviation: two draws make one value of the race about the variance.</summary>
sealed class PairRace(IRace<double> race, MeanFacts facts) : IRace<double>
{
    long _trials;
    double? _first;
    string? _contradiction;

    public Outcome? Outcome { get; private set; }

    public void Add(double draw)
    {
        _trials++;
        if (!double.IsFinite(draw) || draw < facts.Minimum || draw > facts.Maximum)
        {
            _contradiction = $"trial {Wording.Number(_trials)} drew {Wording.Exact(draw)}, which is not {Wording.Facts(facts)["draws ".Length..]}";
            Outcome = Assize.Outcome.Refuted;
        }
        else if (_first is not { } first)
        {
            _first = draw;
        }
        else
        {
            _first = null;
            race.Add((draw - first) * (draw - first) / 2);
            Outcome = race.Outcome;
        }
    }

    public void Add(ReadOnlySpan<double> draws)
    {
        foreach (double draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report()
    {
        var report = race.Report();
        return report with
        {
            Trials = _trials,
            LastTrial = null,
            Observed = Math.Sqrt(report.Observed),
            Interval = (Math.Sqrt(report.Interval.Lower), Math.Sqrt(report.Interval.Upper)),
            Cap = 2 * report.Cap,
            Contradiction = _contradiction ?? report.Contradiction,
        };
    }
}
