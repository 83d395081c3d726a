namespace Assize.Bounds;

/// <summary>The values a claimed quantity can take at all.</summary>
/// <param name="Minimum">The least value, or negative infinity.</param>
/// <param name="Maximum">The greatest value, or positive infinity.</param>
public sealed record Domain(double Minimum, double Maximum)
{
    /// <summary>The domain of a rate or a share: [0, 1].</summary>
    public static Domain Rate { get; } = new(0, 1);

    /// <summary>Every real number.</summary>
    public static Domain Any { get; } = new(double.NegativeInfinity, double.PositiveInfinity);
}
