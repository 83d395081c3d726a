using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>A compiler and a test both wait for a plan.</summary>
sealed class RatePlans : Benchmark
{
    public override string Title => $"a plan for a rate : {Yardstick.Name}";

    public override IEnumerable<Row> Measure()
    {
        yield return Plan("0.5, defect 0.1", Edges.Around(Domain.Rate, 0.5, 0, 0.1), 1e-9, 0.999);
        yield return Plan("0.5, defect 0.001", Edges.Around(Domain.Rate, 0.5, 0, 0.001), 1e-9, 0.999);
        yield return Plan("0.5, tolerance 5e-5, defect 1e-4", Edges.Around(Domain.Rate, 0.5, 5e-5, 1e-4), 1e-9, 0.999);
        yield return Plan("0.3, defect 1e-4, risk 0.05", Edges.Around(Domain.Rate, 0.3, 0, 1e-4), 0.05, 0.95);
        yield return Plan("0.01, tolerance 0.0025", Edges.Around(Domain.Rate, 0.01, 0.0025, 0.005), 1e-6, 0.999);
        yield return Plan("at most 1e-4, defect 1e-4", Edges.AtMost(Domain.Rate, 1e-4, 1e-4), 1e-9, 0.999);
        yield return Plan("at most 1e-8, defect 1e-8", Edges.AtMost(Domain.Rate, 1e-8, 1e-8), 1e-9, 0.999);
        yield return Plan("0.5, defect 1e-4, risk 0.2", Edges.Around(Domain.Rate, 0.5, 0, 1e-4), 0.2, 0.8);
        yield return Plan("0.5, defect 1e-5, risk 0.05", Edges.Around(Domain.Rate, 0.5, 0, 1e-5), 0.05, 0.95);
    }

    static Row Plan(string name, Edges edges, double risk, double confidence)
    {
        long trials = RatePlan.For(edges, risk, confidence).Trials;
        var pair = Paired.Compare(() => Sink.Take(RatePlan.For(edges, risk, confidence).Trials), Yardstick.Millisecond);
        return Row.Of($"{name}: {trials:N0} trials", pair, trials <= 1_000_000_000 ? 1 : null);
    }
}
