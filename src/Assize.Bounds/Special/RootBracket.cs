namespace Assize.Bounds;

/// <summary>A root of a continuous function between two points where its signs differ.</summary>
public static class RootBracket
{
    const int Cap = 300;

    /// <summary>Narrows a bracket until its ends are neighbours or nearly so.</summary>
    /// <param name="function">A continuous function.</param>
    /// <param name="lower">The lower end; the function must not have the same sign here as at the other end.</param>
    /// <param name="upper">The upper end, above the lower one.</param>
    /// <param name="precision">The width, relative to the larger end, at which to stop; in [2e-16, 1).</param>
    /// <returns>The two ends of the final bracket, the root between them.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The ends or the precision lie outside their domain.</exception>
    /// <exception cref="InvalidOperationException">The signs do not differ, or the bracket did not close.</exception>
    public static (double Lower, double Upper) Find(
        Func<double, double> function, double lower, double upper, double precision)
    {
        Check.Between(precision, 2e-16, 1, nameof(precision));
        Check.Inside(lower, double.NegativeInfinity, upper, nameof(lower));
        double atLower = function(lower);
        double atUpper = function(upper);
        if (!(atLower <= 0 && atUpper >= 0) && !(atLower >= 0 && atUpper <= 0))
            throw new InvalidOperationException(
                $"No change of sign between {Check.Text(lower)} ({Check.Text(atLower)}) "
                + $"and {Check.Text(upper)} ({Check.Text(atUpper)}).");

        if (atLower == 0)
            return (lower, lower);

        for (int i = 0; i < Cap; i++)
        {
            if (upper - lower <= precision * Math.Max(Math.Abs(lower), Math.Abs(upper)))
                return (lower, upper);

            // Every third step halves, so that the bracket closes whatever the function's shape.
            double middle = i % 3 == 2
                ? lower + (upper - lower) / 2
                : Inside(lower, upper, atLower, atUpper, precision);
            double atMiddle = function(middle);
            if (atMiddle > 0 == atLower > 0)
                (lower, atLower) = (middle, atMiddle);
            else
                (upper, atUpper) = (middle, atMiddle);
        }

        throw new InvalidOperationException(
            $"The bracket [{Check.Text(lower)}, {Check.Text(upper)}] did not close in {Cap} steps.");
    }

    /// <summary>Where a falling function stops being positive, rounded up; at the greatest point it is not.</summary>
    internal static double Descent(Func<double, double> function, double greatest, double precision)
    {
        double least = greatest / 2;
        while (least > 0 && function(least) <= 0)
            (least, greatest) = (least / 16, least);

        return least > 0 ? Find(function, least, greatest, precision).Upper : greatest;
    }

    // The secant's root, kept half a precision away from the ends so that the bracket closes from both sides.
    static double Inside(double lower, double upper, double atLower, double atUpper, double precision)
    {
        double width = upper - lower;
        double secant = lower + width * (atLower / (atLower - atUpper));
        double margin = Math.Min(width / 2, 0.5 * precision * Math.Max(Math.Abs(lower), Math.Abs(upper)));
        return double.IsNaN(secant) ? lower + width / 2 : Math.Max(lower + margin, Math.Min(upper - margin, secant));
    }
}
