namespace Assize.Benchmarks;

/// <summary>Claims about rates among the trials that qualify; trials counts all of them, the plan those that do.</summary>
sealed class ConditionalRates : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("all qualify", 1),
        Of("one in three qualifies", 1 / 3.0),
        Of("one in twenty qualifies, below", 0.05) with { IsDownwards = true },
    ];

    static CalibratedLaw Of(string name, double qualifying)
    {
        var claim = Claim.RateWhenItQualifies(0.5, 0.05, 0.1);
        return CalibratedLaw.Of("0.5 ± 0.05: " + name, claim, claim.Edges,
            (rng, rate) => rng.NextDouble() < qualifying ? rng.NextDouble() < rate : null);
    }
}
