namespace Assize.Bounds;

/// <summary>The observed shares that a hand-written assertion lets pass.</summary>
/// <remarks>
/// A share exactly on a rim counts as red: whether it passes is decided by the rounding of the assertion's own
/// arithmetic,
/// and an answer about many numbers of trials must be right either way.
/// </remarks>
/// <param name="Low">The lower rim, or null (or a number below 0) when no share is too low.</param>
/// <param name="High">The upper rim, or null (or a number above 1) when no share is too high.</param>
public sealed record ProportionBand(double? Low, double? High);
