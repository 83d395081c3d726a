namespace Assize.Benchmarks;

/// <summary>What the kit adds to a trial that costs next to nothing.</summary>
sealed class SerialTrials : Benchmark
{
    const int Trials = 2_000_000;

    public override string Title => "two million trials judged in a race : the same body over one new Random()";

    public override IEnumerable<Row> Measure()
    {
        // The target's own rate: right code, a race that runs to the cap.
        var claim = Claim.Rate(0.5, tolerance: 0, defect: 0.001).WithTrialCap(Trials);
        yield return Row.Of("one number a trial", Paired.Compare(
            () => Judge(claim, rng => rng.NextDouble() < 0.5),
            () => Loop(rng => rng.NextDouble() < 0.5)), 2.5, Trials);
        yield return Row.Of("three numbers a trial", Paired.Compare(
            () => Judge(claim, rng => rng.NextDouble() + rng.NextDouble() + rng.NextDouble() < 1.5),
            () => Loop(rng => rng.NextDouble() + rng.NextDouble() + rng.NextDouble() < 1.5)), 2.5, Trials);
        yield return Row.Of("a whole number a trial", Paired.Compare(
            () => Judge(claim, rng => rng.Next(6) < 3),
            () => Loop(rng => rng.Next(6) < 3)), 2.5, Trials);
        yield return Row.Of("bare loop without a delegate", Paired.Compare(
            () => Judge(claim, rng => rng.NextDouble() < 0.5),
            Bare), null, Trials);
    }

    static void Judge(RateClaim claim, Func<Random, bool> trial)
    {
        long trials = claim.Judge(trial).Trials;
        if (trials != Trials)
            throw new InvalidOperationException($"The race ended after {trials} trials.");
    }

    static void Loop(Func<Random, bool> body)
    {
        var random = new Random();
        int successes = 0;
        for (int i = 0; i < Trials; i++)
        {
            if (body(random))
                successes++;
        }

        Sink.Take(successes);
    }

    static void Bare()
    {
        var random = new Random();
        int successes = 0;
        for (int i = 0; i < Trials; i++)
        {
            if (random.NextDouble() < 0.5)
                successes++;
        }

        Sink.Take(successes);
    }
}
