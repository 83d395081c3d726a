using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>Claims that two sources have the same rate.</summary>
sealed class SameRates : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("about 0.5, apart", Claim.SameRate(0.05, 0.1).OnIndependentStreams(), 0.5),
        Of("about 0.1, apart", Claim.SameRate(0.05, 0.1).OnIndependentStreams(), 0.1),
        Of("about 0.5, same numbers", Claim.SameRate(0.05, 0.1), 0.5),
    ];

    static CalibratedLaw Of(string name, SameRateClaim claim, double rate) => CalibratedLaw.Of(
        "difference ± 0.05: " + name, claim, Edges.Around(new Domain(-1, 1), 0, 0.05, 0.1),
        (rng, apart) => rng.NextDouble() < rate + apart, rng => rng.NextDouble() < rate);
}
