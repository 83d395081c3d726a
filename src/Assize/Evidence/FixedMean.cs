namespace Assize;

/// <summary>The fixed plan for a mean: so many trials, then its statistic decides.</summary>
sealed class FixedMean : IRace<double>
{
    readonly MeanCap _cap;
    readonly MeanRecord _record;

    public FixedMean(MeanStakes stakes, long trials)
    {
        var plan = stakes.Fixed;
        _cap = plan.IsByInfluence ? new InfluenceCap(plan, trials) : new AverageCap(plan, plan.LimitsAt(trials));
        _record = new MeanRecord(stakes, trials);
    }

    public Outcome? Outcome { get; private set; }

    public void Add(double draw) => Outcome = _record.Add(draw) ? _cap.Add(draw) : Assize.Outcome.Refuted;

    public void Add(ReadOnlySpan<double> draws)
    {
        foreach (double draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report() => _record.Report(double.NegativeInfinity, null, null, _cap.Theorem) with
    {
        Accepts = Outcome is null || _record.Contradiction is not null ? null : _cap.Accepts,
    };
}
