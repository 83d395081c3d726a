using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>Tails of gamma laws, Poisson counts and variances of normal draws.</summary>
sealed class GammaTails : Benchmark
{
    public override string Title => $"a tail of a gamma law : {Yardstick.Name}";

    public override IEnumerable<Row> Measure()
    {
        foreach (double shape in (double[])[100, 1e4, 99_999, 1e6, 1e9])
        {
            foreach (double spreads in (double[])[-6, 0, 6])
            {
                double point = shape + spreads * Math.Sqrt(shape);
                yield return Row.Of($"shape {shape}, {spreads} deviations", Paired.Compare(
                    () => Sink.Take(IncompleteGamma.LowerTail(shape, point)), Yardstick.Millisecond), 0.05);
            }
        }
    }
}
