namespace Assize.Benchmarks;

/// <summary>Claims that an estimate is within 1 of the truth with probability 0.9; what is moved is the probability.</summary>
sealed class Accuracies : CalibratedFamily
{
    public override IEnumerable<CalibratedLaw> Laws =>
    [
        Of("uniform error", (rng, share) => (rng.NextDouble() / share, 0)),
        Of("one-sided error of a moving truth", Below),
        Of("right or far off", (rng, share) => (rng.NextDouble() < share ? 0 : 1e9, 0)),
    ];

    static (double, double) Below(Random rng, double share)
    {
        double truth = rng.NextDouble();
        return (truth - rng.NextDouble() / share, truth);
    }

    static CalibratedLaw Of(string name, Func<Random, double, (double, double)> draw)
    {
        var claim = Claim.Accuracy(error: 1, probability: 0.9, defect: 0.1);
        return CalibratedLaw.Of("0.9: " + name, claim, claim.Edges, draw) with
        {
            IsDownwards = true,
            Information = Draws.BernoulliInformation,
        };
    }
}
