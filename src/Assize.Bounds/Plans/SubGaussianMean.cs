namespace Assize.Bounds;

/// <summary>Chernoff's bound for draws whose tails are no heavier than a normal one's.</summary>
sealed class SubGaussianMean : MeanTheorem
{
    public override string Name => "Chernoff, sub-Gaussian";

    public override string Assumes => "independent draws with tails no heavier than normal ones";

    public override bool Applies(MeanFacts facts) => facts.Proxy is not null;

    // E exp(λ(average - mean)) ≤ exp(λ²·proxy²/(2n)), and λ = n·margin/proxy² is best.
    public override double Beyond(MeanFacts facts, long trials, double mean, double margin)
    {
        double share = margin / facts.Proxy!.Value;
        return Enclosure.UpToExponential(trials * share * share / 2).Upper;
    }
}
