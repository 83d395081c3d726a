namespace Assize.Benchmarks;

/// <summary>Claims about standard deviations of normal draws; the law is given, so the numbers vary.</summary>
sealed class NormalSpreads : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("1 ± 0.1", Claim.StandardDeviation(1, 0.1, 0.2).DrawsNormal(), 0),
        Of("1 ± 0.1, below, centre 1e6", Claim.StandardDeviation(1, 0.1, 0.2).DrawsNormal(), 1e6) with
        {
            IsDownwards = true,
        },
        Of("at most 1", Claim.StandardDeviationAtMost(1, 0.2).DrawsNormal(), -3),
    ];

    static CalibratedLaw Of(string name, NormalSpreadClaim claim, double centre) =>
        CalibratedLaw.Of(name, claim, claim.Edges, (rng, deviation) => Draws.Normal(rng, centre, deviation)) with
        {
            // Of the variance with the centre known: with it unknown there is less.
            Information = (a, b) => (a * a / (b * b) - 1 - Math.Log(a * a / (b * b))) / 2,
        };
}
