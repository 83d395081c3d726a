namespace Assize.Benchmarks;

/// <summary>Whether memory grows with trials.</summary>
sealed class Memory : Benchmark
{
    const int Few = 1_000_000;
    const int Many = 2_000_000;

    public override string Title => "bytes allocated by each trial of a second million";

    public override IEnumerable<Row> Measure()
    {
        yield return Of("rate, one thread", Claim.Rate(0.5, tolerance: 0, defect: 0.001), rng => rng.NextDouble() < 0.5);
        yield return Of("rate, two threads", Claim.Rate(0.5, tolerance: 0, defect: 0.001).InParallel(2), rng => rng.NextDouble() < 0.5);
    }

    static Row Of<TDraw>(string name, Claim<TDraw> claim, Func<Random, TDraw> trial)
    {
        long Bytes(int trials)
        {
            long before = GC.GetTotalAllocatedBytes(precise: true);
            claim.WithTrialCap(trials).Judge(trial);
            return GC.GetTotalAllocatedBytes(precise: true) - before;
        }

        Bytes(Few);
        var each = Enumerable.Range(0, 5).Select(_ => (Bytes(Many) - Bytes(Few)) / (double)(Many - Few)).Order().ToArray();
        return new Row(name, each[0], each[each.Length / 2], 0.5, $"{Bytes(Few):N0} bytes for the first million") { Unit = " B" };
    }
}
