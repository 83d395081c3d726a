namespace Assize.Bounds;

/// <summary>How improbable a count is at a given mean: the exponent of every saddle-point mass.</summary>
static class CountDeviance
{
    /// <summary>count · ln(count / mean) + mean - count, where excess = mean - count is given without cancellation; in
    /// [0, ∞].</summary>
    public static double Of(double count, double excess, double mean)
    {
        if (count == 0)
            return excess;
        if (mean == 0)
            return double.PositiveInfinity;

        double relative = excess / count;
        return relative > -0.5
            ? count * Elementary.LogShortfall(relative)
            : count * (relative - Elementary.Log(mean / count));
    }
}
