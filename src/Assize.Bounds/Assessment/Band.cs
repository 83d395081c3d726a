namespace Assize.Bounds;

/// <summary>The values of a statistic that an assertion lets pass.</summary>
/// <param name="Low">The lower rim; null when no value is too low.</param>
/// <param name="High">The upper rim; null when no value is too high.</param>
/// <param name="LowPasses">Whether the lower rim itself passes.</param>
/// <param name="HighPasses">Whether the upper rim itself passes.</param>
public sealed record Band(double? Low, double? High, bool LowPasses = true, bool HighPasses = true)
{
    /// <summary>The band for a multiple of the statistic.</summary>
    internal Band Times(double factor) => this with { Low = factor * Low, High = factor * High };

    /// <summary>The band for the statistic with its sign changed.</summary>
    internal Band Mirrored() => new(-High, -Low, HighPasses, LowPasses);
}
