namespace Assize.Benchmarks;

/// <summary>Claims about standard deviations of draws in [0, 1].</summary>
sealed class Spreads : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("two points", (rng, deviation) => Draws.TwoPoints(rng, 0.5, deviation)),
        Of("uniform", (rng, deviation) => Draws.Uniform(rng, 0.5, deviation)),
        Of("half still", HalfStill),
        Of("uniform, below", (rng, deviation) => Draws.Uniform(rng, 0.5, deviation)) with { IsDownwards = true },
    ];

    static double HalfStill(Random rng, double deviation) =>
        rng.NextDouble() < 0.5 ? 0.5 : Draws.TwoPoints(rng, 0.5, deviation * Math.Sqrt(2));

    static CalibratedLaw Of(string name, Func<Random, double, double> draw)
    {
        var claim = Claim.StandardDeviation(0.2, 0.02, 0.04).DrawsBetween(0, 1);
        return CalibratedLaw.Of("0.2 ± 0.02: " + name, claim, claim.Edges, draw);
    }
}
