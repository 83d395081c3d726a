namespace Assize.Benchmarks;

/// <summary>Claims about means of draws in [0, 1].</summary>
sealed class MeansInARange : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("0 or 1", Draws.Bernoulli) with { Information = Draws.BernoulliInformation },
        Of("uniform, deviation 0.1", (rng, mean) => Draws.Uniform(rng, mean, 0.1)),
        Of("rarely 1, deviation 0.2", Draws.RarelyOne),
        Of("rarely 0, deviation 0.2", (rng, mean) => 1 - Draws.RarelyOne(rng, 1 - mean)),
        Of("rarely 1, below", Draws.RarelyOne) with { IsDownwards = true },
    ];

    static CalibratedLaw Of(string name, Func<Random, double, double> draw)
    {
        var claim = Claim.Mean(0.5, 0.05, 0.1).DrawsBetween(0, 1);
        return CalibratedLaw.Of("0.5 ± 0.05: " + name, claim, claim.Edges, draw);
    }
}
