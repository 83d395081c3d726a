using Assize.Bounds;

namespace Assize;

/// <summary>Looks at how far the draws of two sources are apart, at the plan's numbers of trials.</summary>
sealed class SameDistributionRace(DistributionPlan plan, long? authorCap) : IRace<(double One, double Other)>
{
    readonly long _cap = Math.Min(plan.Looks[^1], authorCap ?? long.MaxValue);
    readonly SortedDraws _one = new(plan.Looks[^1]);
    readonly SortedDraws _other = new(plan.Looks[^1]);
    int _look;
    string? _contradiction;
    long _trials;

    public Outcome? Outcome { get; private set; }

    public long Quiet => Outcome is null ? Math.Min(plan.Looks[_look], _cap) - _trials : 1;

    public void Add((double One, double Other) draw)
    {
        _trials++;
        if (double.IsNaN(draw.One) || double.IsNaN(draw.Other))
        {
            string source = double.IsNaN(draw.One) ? "one" : "other";
            (Outcome, _contradiction) = (Assize.Outcome.Refuted, $"trial {Wording.Number(_trials)} drew NaN from the {source} source, which is no number");
            return;
        }

        _one.Add(draw.One);
        _other.Add(draw.Other);
        if (_trials == plan.Looks[_look])
        {
            double distance = Measure().Value;
            Outcome = plan.Refutes(_trials, distance) ? Assize.Outcome.Refuted
                : plan.Upholds(_trials, distance) ? Assize.Outcome.Upheld
                : null;
            _look++;
        }

        if (Outcome is null && _trials == _cap)
            Outcome = Assize.Outcome.Undecided;
    }

    public void Add(ReadOnlySpan<(double One, double Other)> draws)
    {
        foreach (var draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report() => DistanceReport.Of(plan, _trials, _one.Count == 0 ? null : Measure(), _cap, _contradiction);

    Distance Measure()
    {
        _one.Settle();
        _other.Settle();
        return Distance.Between(_one.Values, _other.Values);
    }
}
