namespace Assize.Analyzers;

/// <summary>How often a test runs: it is green when, in each of the repeats, any of the tries is.</summary>
sealed record Runs(long Repeats, long Tries)
{
    public static Runs Once { get; } = new(1, 1);
}
