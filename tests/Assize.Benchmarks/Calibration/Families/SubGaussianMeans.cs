namespace Assize.Benchmarks;

/// <summary>Claims about means of sub-Gaussian draws, proxy 1.</summary>
sealed class SubGaussianMeans : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("normal", (rng, mean) => Draws.Normal(rng, mean, 1)) with { Information = (a, b) => (a - b) * (a - b) / 2 },
        Of("two points", (rng, mean) => Draws.TwoPoints(rng, mean, 1)),
        Of("uniform on a length of 2", (rng, mean) => mean + 2 * rng.NextDouble() - 1),
        Of("normal, below", (rng, mean) => Draws.Normal(rng, mean, 1)) with { IsDownwards = true },
    ];

    static CalibratedLaw Of(string name, Func<Random, double, double> draw)
    {
        var claim = Claim.Mean(0, 0.2, 0.4).DrawsSubGaussian(1);
        return CalibratedLaw.Of("0 ± 0.2: " + name, claim, claim.Edges, draw);
    }
}
