namespace Assize.Benchmarks;

/// <summary>Runs benchmarks and prints their rows.</summary>
static class BenchmarkTable
{
    /// <summary>All benchmarks, or those whose names contain one of the words.</summary>
    /// <returns>0, or 1 when a limit was passed.</returns>
    public static int Write(IReadOnlyCollection<string> words)
    {
        bool isKept = true;
        Console.WriteLine($"  {"case",-46} {"best",9} {"median",9} {"limit",9}");
        foreach (var benchmark in Found.Of<Benchmark>(words))
        {
            Console.WriteLine($"\n{benchmark.GetType().Name}: {benchmark.Title}");
            foreach (var row in benchmark.Measure())
            {
                Console.WriteLine(row);
                isKept &= row.IsKept;
            }
        }

        return isKept ? 0 : 1;
    }
}
