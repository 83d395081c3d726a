namespace Assize.Benchmarks;

/// <summary>Claims that 1 is the 90 % quantile; the truth is the share of draws up to it.</summary>
sealed class Quantiles : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("uniform", (rng, share) => rng.NextDouble() / share),
        Of("exponential", (rng, share) => Math.Log(1 - rng.NextDouble()) / Math.Log(1 - share)),
        Of("uniform, below", (rng, share) => rng.NextDouble() / share) with { IsDownwards = true },
        // Ties at the value count as below it for one bet and not for the other.
        Of("half of the rest ties", (rng, share) => Ties(rng, share, (1 + share) / 2)),
        Of("half of the others tie, below", (rng, share) => Ties(rng, share / 2, share)) with { IsDownwards = true },
    ];

    static double Ties(Random rng, double below, double upTo)
    {
        double place = rng.NextDouble();
        return place < below ? 0 : place < upTo ? 1 : 2;
    }

    static CalibratedLaw Of(string name, Func<Random, double, double> draw)
    {
        var claim = Claim.Quantile(0.9, value: 1, tolerance: 0.02, defect: 0.04);
        return CalibratedLaw.Of("90 % ± 2 %: " + name, claim, claim.Edges, draw);
    }
}
