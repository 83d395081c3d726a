using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>Plans for means, by what is known of a draw.</summary>
sealed class MeanPlans : Benchmark
{
    const double Limit = 5;

    public override string Title => $"a plan for a mean : {Yardstick.Name}";

    public override IEnumerable<Row> Measure()
    {
        var range = MeanFacts.None.Between(0, 1);
        yield return Plan("in [0, 1], 0.5, defect 0.1", 0.5, 0, 0.1, range);
        yield return Plan("in [0, 1], 0.5 ± 0.01", 0.5, 0.01, 0.02, range);
        yield return Plan("in [0, 1], 0.01, defect 0.001", 0.01, 0, 0.001, range);
        yield return Plan("in [0, 1], 0.5, defect 1e-4", 0.5, 0, 1e-4, range);
        yield return Plan("in [0, 1], deviation 0.1, ± 0.01", 0.5, 0.01, 0.02, range.DeviatingAtMost(0.1));
        yield return Plan("deviation 1, defect 0.1", 0, 0, 0.1, MeanFacts.None.DeviatingAtMost(1));
        yield return Plan("deviation 1, defect 1e-4", 0, 0, 1e-4, MeanFacts.None.DeviatingAtMost(1));
        yield return Plan("sub-Gaussian 1, defect 0.01", 0, 0, 0.01, MeanFacts.None.SubGaussian(1));
    }

    static Row Plan(string name, double target, double tolerance, double defect, MeanFacts facts)
    {
        var domain = facts.Range is null ? Domain.Any : new Domain(0, 1);
        var edges = Edges.Around(domain, target, tolerance, defect);
        long trials = MeanPlan.For(edges, facts, 1e-9, 0.999).Trials;
        var pair = Paired.Compare(
            () => Sink.Take(MeanPlan.For(edges, facts, 1e-9, 0.999).Trials), Yardstick.Millisecond);
        return Row.Of($"{name}: {trials:N0}", pair, Limit);
    }
}
