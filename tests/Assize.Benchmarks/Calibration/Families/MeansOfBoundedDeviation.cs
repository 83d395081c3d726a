namespace Assize.Benchmarks;

/// <summary>Claims about means of draws without bounds, standard deviation 1 at most.</summary>
sealed class MeansOfBoundedDeviation : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("normal", (rng, mean) => Draws.Normal(rng, mean, 1)) with { Information = (a, b) => (a - b) * (a - b) / 2 },
        Of("exponential", Draws.Exponential),
        Of("exponential, below", Draws.Exponential) with { IsDownwards = true },
        Of("far atom", Draws.FarAtom),
        Of("two points", (rng, mean) => Draws.TwoPoints(rng, mean, 1)),
    ];

    static CalibratedLaw Of(string name, Func<Random, double, double> draw)
    {
        var claim = Claim.Mean(0, 0.2, 0.4).DrawsDeviateAtMost(1);
        return CalibratedLaw.Of("0 ± 0.2: " + name, claim, claim.Edges, draw);
    }
}
