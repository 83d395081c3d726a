namespace Assize.Benchmarks;

/// <summary>Claims about rates; a yes or no has no other law than its rate, so the numbers vary.</summary>
sealed class Rates : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("0.5, defect 0.1", Claim.Rate(0.5, 0, 0.1)),
        Of("0.5 ± 0.05, defect 0.1", Claim.Rate(0.5, 0.05, 0.1)),
        Of("0.5 ± 0.05, defect 0.1, below", Claim.Rate(0.5, 0.05, 0.1)) with { IsDownwards = true },
        Of("0.1 ± 0.02, defect 0.04", Claim.Rate(0.1, 0.02, 0.04)),
        Of("at most 0.05, defect 0.05", Claim.RateAtMost(0.05, 0.05)),
        Of("at least 0.9, defect 0.1", Claim.RateAtLeast(0.9, 0.1)) with { IsDownwards = true },
        Of("never, defect 0.02", Claim.RateAtMost(0, 0.02)),
    ];

    static CalibratedLaw Of(string name, RateClaim claim) =>
        CalibratedLaw.Of(name, claim, claim.Edges, (rng, rate) => rng.NextDouble() < rate) with
        {
            Information = Draws.BernoulliInformation,
        };
}
