using Assize.Bounds;

namespace Assize;

/// <summary>Looks at how far draws are from a cumulative distribution, at the plan's numbers of trials.</summary>
sealed class DistributionRace(DistributionPlan plan, Func<double, double> cumulative, long? authorCap) : IRace<double>
{
    // Library functions are wrong in their last digits; a function that is not monotone is wrong by more.
    const double Rounding = 1e-9;

    readonly long _cap = Math.Min(plan.Looks[^1], authorCap ?? long.MaxValue);
    readonly SortedDraws _draws = new(plan.Looks[^1], 2);
    int _look;
    string? _contradiction;
    long _trials;

    public Outcome? Outcome { get; private set; }

    public long Quiet => Outcome is null ? Math.Min(plan.Looks[_look], _cap) - _trials : 1;

    public void Add(double draw)
    {
        _trials++;
        if (double.IsNaN(draw))
        {
            (Outcome, _contradiction) = (Assize.Outcome.Refuted, $"trial {Wording.Number(_trials)} drew NaN, which is no number");
            return;
        }

        _draws.Add(draw);
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

    public void Add(ReadOnlySpan<double> draws)
    {
        foreach (double draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report() => DistanceReport.Of(plan, _trials, _draws.Count == 0 ? null : Measure(), _cap, _contradiction);

    Distance Measure()
    {
        _draws.Settle(Evaluate);
        var values = _draws.Values;
        var upTo = _draws.Numbers(0);
        var below = _draws.Numbers(1);
        for (int i = 1; i < values.Length; i++)
        {
            if (values[i - 1] < values[i] && !(upTo[i - 1] <= below[i] + Rounding))
                throw new ClaimRefusedException("A cumulative distribution never falls; this one does, "
                    + $"from {Wording.Exact(upTo[i - 1])} at {Wording.Exact(values[i - 1])} to {Wording.Exact(below[i])} at {Wording.Exact(values[i])}. Mend the function.");
        }

        return Distance.Of(values, upTo, below);
    }

    // What lies below a double lies up to the next smaller one: a jump at the draw itself is seen from both sides.
    void Evaluate(double draw, Span<double> numbers)
    {
        numbers[0] = At(draw);
        numbers[1] = At(Math.BitDecrement(draw));
        if (!(numbers[1] <= numbers[0] + Rounding))
            throw new ClaimRefusedException("A cumulative distribution never falls; this one does, "
                + $"from {Wording.Exact(numbers[1])} to {Wording.Exact(numbers[0])} at {Wording.Exact(draw)}. Mend the function.");
    }

    double At(double point)
    {
        double value = cumulative(point);
        return value is >= -Rounding and <= 1 + Rounding
            ? value
            : throw new ClaimRefusedException($"A cumulative distribution lies between 0 and 1; at {Wording.Exact(point)} this one is {Wording.Exact(value)}. Mend the function.");
    }
}
