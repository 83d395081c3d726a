namespace Assize.Benchmarks;

/// <summary>Claims about means of draws that are never negative, mean square 4 at most.</summary>
sealed class NonNegativeMeans : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("exponential", (rng, mean) => -mean * Math.Log(1 - rng.NextDouble())),
        Of("exponential, below", (rng, mean) => -mean * Math.Log(1 - rng.NextDouble())) with { IsDownwards = true },
        Of("0 or 2.8", (rng, mean) => 2.8 * Draws.Bernoulli(rng, mean / 2.8)),
        Of("uniform from 0, below", (rng, mean) => 2 * mean * rng.NextDouble()) with { IsDownwards = true },
    ];

    static CalibratedLaw Of(string name, Func<Random, double, double> draw)
    {
        var claim = Claim.Mean(1, 0.1, 0.2).DrawsNonNegative(4);
        return CalibratedLaw.Of("1 ± 0.1: " + name, claim, claim.Edges, draw);
    }
}
