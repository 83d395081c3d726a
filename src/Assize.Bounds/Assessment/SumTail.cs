namespace Assize.Bounds;

/// <summary>How often a sum of draws lies beyond a rim: by the closed form of its law, exactly on a lattice, else
/// tilted and enclosed.</summary>
static class SumTail
{
    // Above the error of a closed form, and of the point it is taken at.
    const double Rounding = 1e-11;

    // More draws than this on a lattice take too long inside a compiler.
    const double MostSteps = 1e6;

    /// <summary>The theorem that answers for these draws.</summary>
    public static string TheoremFor(Draws draws) =>
        Closed(draws) is { } closed ? closed.Name : OnLattice(draws) ? "exact lattice sum" : "tilted Berry–Esseen";

    /// <summary>P(sum &gt; rim), or P(sum ≥ rim) when the rim itself counts.</summary>
    public static Enclosure Above(Draws draws, double rim, bool withRim)
    {
        if (Closed(draws) is { } closed)
            return Around(closed.Upper(rim));
        if (!OnLattice(draws))
            return TiltedSum.UpperTail(draws, rim);

        // Half a step beyond an attainable total no rounding matters.
        double step = ((ILattice)draws.Groups[0].Law).Step!.Value;
        double steps = (rim - draws.Minimum) / step;
        double nearest = Math.Round(steps);
        bool isAttainable = Math.Abs(steps - nearest) <= 1e-9 * Math.Max(1, Math.Abs(steps));
        double from = isAttainable ? nearest + (withRim ? -0.5 : 0.5) : steps;
        return LatticeSum.UpperTail(draws, draws.Minimum + Math.Ceiling(from) * step);
    }

    /// <summary>P(sum &lt; rim), or P(sum ≤ rim) when the rim itself counts.</summary>
    public static Enclosure Below(Draws draws, double rim, bool withRim) => Closed(draws) is { } closed
        ? Around(closed.Lower(rim))
        : Above(draws.Mirrored(), -rim, withRim);

    // All draws of one law whose step divides everything: other lattices are left to the tilted form.
    static bool OnLattice(Draws draws) =>
        draws is { Identical: true } && draws.Groups[0].Law is ILattice { Step: { } step } && !double.IsInfinity(draws.Minimum)
        && (double.IsInfinity(draws.Maximum) ? Math.Sqrt(draws.Variance) / step : (draws.Maximum - draws.Minimum) / step) <= MostSteps;

    static (string Name, Func<double, double> Upper, Func<double, double> Lower)? Closed(Draws draws)
    {
        if (!draws.Identical)
            return draws.Groups.All(group => Plain(group.Law).Law is Normal) ? OfNormal(draws) : null;

        var (law, scale, shift) = Plain(draws.Groups[0].Law);
        long count = draws.Groups[0].Count;
        if (law is Normal)
            return OfNormal(draws);
        if (law is not Gamma gamma)
            return null;

        var (shape, unit) = gamma.Parts;
        double Point(double rim) => Math.Max(0, (rim - count * shift) / scale / unit);
        double Upper(double rim) => IncompleteGamma.UpperTail(shape * count, Point(rim));
        double Lower(double rim) => IncompleteGamma.LowerTail(shape * count, Point(rim));
        return shape * count > 1e9 ? null
            : scale > 0 ? ("exact gamma", Upper, Lower)
            : ("exact gamma", Lower, Upper);
    }

    static (string, Func<double, double>, Func<double, double>) OfNormal(Draws draws)
    {
        double deviation = Math.Sqrt(draws.Variance);
        return (
            "exact normal",
            rim => NormalTail.Upper((rim - draws.Mean) / deviation),
            rim => NormalTail.Lower((rim - draws.Mean) / deviation));
    }

    static (Law Law, double Scale, double Shift) Plain(Law law)
    {
        double scale = 1, shift = 0;
        while (law is Affine affine)
        {
            var parts = affine.Parts;
            shift += scale * parts.Shift;
            scale *= parts.Scale;
            law = parts.Law;
        }

        return (law, scale, shift);
    }

    static Enclosure Around(double probability) =>
        new(probability * (1 - Rounding), Math.Min(1, probability * (1 + Rounding)));
}
