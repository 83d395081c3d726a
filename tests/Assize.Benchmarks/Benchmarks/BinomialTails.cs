using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>The tail that every rate rests on, against a library's.</summary>
sealed class BinomialTails : Benchmark
{
    const int Points = 64;

    public override string Title => "lower binomial tail : MathNet.Numerics Binomial.CDF";

    public override IEnumerable<Row> Measure()
    {
        foreach (int trials in (int[])[1_000, 10_000, 100_000, 1_000_000])
        {
            foreach (double rate in (double[])[0.5, 0.01])
            {
                var counts = Counts(trials, rate);
                yield return Row.Of($"{trials} trials, rate {rate}", Paired.Compare(
                    () => Sink.Take(counts.Sum(count => Binomial.LowerTail(trials, count, rate))),
                    () => Sink.Take(counts.Sum(count => MathNet.Numerics.Distributions.Binomial.CDF(rate, trials, count)))),
                    1, Points);
            }
        }
    }

    // From the centre to six deviations out, on both sides.
    static int[] Counts(int trials, double rate) =>
    [
        .. Enumerable.Range(0, Points).Select(i =>
            (int)Math.Clamp(trials * rate + (i - Points / 2) * 12.0 / Points * Math.Sqrt(trials * rate * (1 - rate)), 0, trials)),
    ];
}
