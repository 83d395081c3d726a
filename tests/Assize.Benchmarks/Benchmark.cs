namespace Assize.Benchmarks;

/// <summary>Something whose cost has a limit. One file a benchmark, found by reflection; its name is the type's.</summary>
abstract class Benchmark
{
    /// <summary>What is measured against what.</summary>
    public abstract string Title { get; }

    /// <summary>Measures; each row as soon as it is known.</summary>
    public abstract IEnumerable<Row> Measure();
}
