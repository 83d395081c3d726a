namespace Assize.Benchmarks;

/// <summary>What a second thread gains; only on a machine that is otherwise idle.</summary>
sealed class TwoThreads : Benchmark
{
    const int Trials = 40_000;

    public override string Title => "one thread : two threads, for trials of a microsecond and more";

    public override IEnumerable<Row> Measure()
    {
        foreach (int draws in (int[])[400, 4_000])
        {
            int trials = 400 * Trials / draws;
            var claim = Claim.Rate(0.5, tolerance: 0, defect: 0.001).WithTrialCap(trials);
            bool Trial(Random rng)
            {
                double sum = 0;
                for (int i = 0; i < draws; i++)
                    sum += rng.NextDouble();
                return sum < draws / 2.0;
            }

            var pair = Paired.Compare(() => claim.Judge(Trial), () => claim.InParallel(2).Judge(Trial));
            yield return Row.Of($"{draws} numbers a trial", pair, 1.8, trials) with { IsAtLeast = true };
        }
    }
}
