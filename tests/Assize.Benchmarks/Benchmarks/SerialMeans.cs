namespace Assize.Benchmarks;

/// <summary>What judging adds to draws that are numbers: a race of means looks at every one.</summary>
sealed class SerialMeans : Benchmark
{
    const int Trials = 100_000;

    public override string Title => "a hundred thousand draws judged in a race : the same draws summed";

    public override IEnumerable<Row> Measure()
    {
        var claim = Claim.Mean(0.5, tolerance: 0, defect: 0.002);
        yield return Of("in [0, 1]", claim.DrawsBetween(0, 1));
        yield return Of("deviation 0.3", claim.DrawsDeviateAtMost(0.3));
        yield return Of("sub-Gaussian 0.5", claim.DrawsSubGaussian(0.5));
    }

    static Row Of(string name, MeanClaim claim)
    {
        var capped = claim.WithTrialCap(Trials);
        long trials = capped.Judge(rng => rng.NextDouble()).Trials;
        var pair = Paired.Compare(() => capped.Judge(rng => rng.NextDouble()), () => Sum(trials));
        return Row.Of($"{name}: {trials} trials", pair, null, trials);
    }

    static void Sum(long trials)
    {
        var random = new Random();
        double sum = 0;
        for (long i = 0; i < trials; i++)
            sum += random.NextDouble();
        Sink.Take(sum);
    }
}
