using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>Claims that two sources have the same mean.</summary>
sealed class SameMeans : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("uniform, apart", InRange.OnIndependentStreams(), (rng, mean) => Draws.Uniform(rng, mean, 0.1)),
        Of("rarely 1, same numbers", InRange, Draws.RarelyOne),
        Of("0 or 1, apart", InRange.OnIndependentStreams(), Draws.Bernoulli),
        Of("exponential, deviation 1", Claim.SameMean(0.05, 0.1).DifferenceDeviatesAtMost(1).OnIndependentStreams(),
            (rng, mean) => Draws.Exponential(rng, 0) * 0.7 + mean),
    ];

    static SameMeanClaim InRange => Claim.SameMean(0.05, 0.1).DrawsBetween(0, 1);

    static CalibratedLaw Of(string name, SameMeanClaim claim, Func<Random, double, double> draw) => CalibratedLaw.Of(
        "difference ± 0.05: " + name, claim, Edges.Around(Domain.Any, 0, 0.05, 0.1),
        (rng, apart) => draw(rng, 0.5 + apart), rng => draw(rng, 0.5));
}
