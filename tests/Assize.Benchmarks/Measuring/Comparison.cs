namespace Assize.Benchmarks;

/// <summary>Two workloads timed side by side.</summary>
/// <param name="Subject">The least time of one call of the subject, in seconds.</param>
/// <param name="Reference">The least time of one call of the reference, in seconds.</param>
/// <param name="Median">The median over pairs of subject by reference.</param>
sealed record Comparison(double Subject, double Reference, double Median)
{
    /// <summary>Least time by least time.</summary>
    public double Best => Subject / Reference;
}
