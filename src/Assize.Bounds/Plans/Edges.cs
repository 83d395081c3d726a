namespace Assize.Bounds;

/// <summary>What is claimed about a quantity: a target, and on each side the edge of what is right and the defect to
/// catch.</summary>
/// <remarks>
/// A side that cannot exist is null: the side nobody claimed, an edge beyond which the quantity cannot go, a defect
/// outside
/// the <see cref="Domain"/>. A defect on the rim of the domain is a side. LowerDefect &lt; LowerEdge ≤ Target ≤
/// UpperEdge &lt; UpperDefect.
/// </remarks>
public sealed record Edges
{
    Edges(Domain domain, double target) => (Domain, Target) = (domain, target);

    /// <summary>The values the quantity can take.</summary>
    public Domain Domain { get; }

    /// <summary>The value claimed.</summary>
    public double Target { get; }

    /// <summary>From here downwards the quantity is surely wrong; null when there is nothing to catch below.</summary>
    public double? LowerDefect { get; private init; }

    /// <summary>The least value that is still right; null when no value is too low.</summary>
    public double? LowerEdge { get; private init; }

    /// <summary>The greatest value that is still right; null when no value is too high.</summary>
    public double? UpperEdge { get; private init; }

    /// <summary>From here upwards the quantity is surely wrong; null when there is nothing to catch above.</summary>
    public double? UpperDefect { get; private init; }

    /// <summary>The claim that a quantity is its target, give or take a tolerance.</summary>
    /// <param name="domain">The values the quantity can take.</param>
    /// <param name="target">The value claimed, in the domain.</param>
    /// <param name="tolerance">How far from the target is still right: a distance, in [0, ∞).</param>
    /// <param name="defect">How far from the target must be caught: a distance above the tolerance; null for twice
    /// the tolerance.</param>
    /// <returns>The edges, each exact in decimal before it is rounded to a double.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to
    /// catch.</exception>
    public static Edges Around(Domain domain, double target, double tolerance, double? defect = null)
    {
        RequireTarget(domain, target);
        if (!(tolerance >= 0 && tolerance <= double.MaxValue))
            throw Refused($"The tolerance must be a distance of 0 or more; it is {Check.Text(tolerance)}.");
        if (tolerance == 0 && defect is null)
            throw Refused("A tolerance of 0 needs an explicit defect: "
                + "say how far from the target must be caught, for example defect: 0.01.");

        double caught = defect ?? 2 * tolerance;
        RequireDefect(caught);
        if (!(caught > tolerance))
            throw Refused($"The defect ({Check.Text(caught)}) must be a greater distance than the tolerance "
                + $"({Check.Text(tolerance)}): between them either verdict is right.");

        var edges = new Edges(domain, target)
        {
            LowerDefect = Defect(domain, Minus(target, caught)),
            LowerEdge = LowerEdgeOf(domain, Minus(target, tolerance)),
            UpperEdge = UpperEdgeOf(domain, Plus(target, tolerance)),
            UpperDefect = Defect(domain, Plus(target, caught)),
        };
        RequireBelow(edges.LowerDefect ?? double.NegativeInfinity, edges.LowerEdge ?? target, caught);
        RequireBelow(edges.UpperEdge ?? target, edges.UpperDefect ?? double.PositiveInfinity, caught);
        return edges.LowerDefect is null && edges.UpperDefect is null
            ? throw Refused($"Both defects, {Check.Text(Minus(target, caught))} and {Check.Text(Plus(target, caught))}, "
                + $"lie outside {Text(domain)}: there is nothing to catch. Choose a smaller defect.")
            : edges;
    }

    /// <summary>The claim that a quantity lies between two edges, with its own defect beyond each.</summary>
    /// <param name="domain">The values the quantity can take.</param>
    /// <param name="target">The value claimed, in the domain and between the edges.</param>
    /// <param name="lowerDefect">From here downwards it must be caught: a value below the lower edge; null for
    /// nothing to catch.</param>
    /// <param name="lowerEdge">The least value that is still right; null when no value is too low.</param>
    /// <param name="upperEdge">The greatest value that is still right; null when no value is too high.</param>
    /// <param name="upperDefect">From here upwards it must be caught: a value above the upper edge; null for nothing
    /// to catch.</param>
    /// <returns>The edges; those outside the domain are dropped.</returns>
    /// <exception cref="ClaimRefusedException">A number is out of order or NaN, or nothing is left to
    /// catch.</exception>
    public static Edges Between(
        Domain domain, double target, double? lowerDefect, double? lowerEdge, double? upperEdge, double? upperDefect)
    {
        RequireTarget(domain, target);
        RequireOrder(lowerEdge ?? double.NegativeInfinity, target, upperEdge ?? double.PositiveInfinity);
        RequireBeyond(lowerEdge, lowerDefect, lowerDefect < lowerEdge);
        RequireBeyond(upperEdge, upperDefect, upperDefect > upperEdge);
        var edges = new Edges(domain, target)
        {
            LowerDefect = lowerDefect is { } below ? Defect(domain, below) : null,
            LowerEdge = lowerEdge is { } lower ? LowerEdgeOf(domain, lower) : null,
            UpperEdge = upperEdge is { } upper ? UpperEdgeOf(domain, upper) : null,
            UpperDefect = upperDefect is { } above ? Defect(domain, above) : null,
        };
        return edges.LowerDefect is null && edges.UpperDefect is null
            ? throw Refused($"No defect lies inside {Text(domain)}: there is nothing to catch. "
                + "Give a defect nearer to its edge.")
            : edges;
    }

    /// <summary>The claim that a quantity is its target or more.</summary>
    /// <param name="domain">The values the quantity can take.</param>
    /// <param name="target">The least value that is right, in the domain.</param>
    /// <param name="defect">How far below the target must be caught: a distance above 0.</param>
    /// <returns>Edges with a lower side only.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to
    /// catch.</exception>
    public static Edges AtLeast(Domain domain, double target, double defect)
    {
        RequireTarget(domain, target);
        RequireDefect(defect);
        double caught = Minus(target, defect);
        RequireBelow(caught, target, defect);
        return new Edges(domain, target)
        {
            LowerDefect = Defect(domain, caught) ?? throw NothingToCatch(domain, caught),
            LowerEdge = LowerEdgeOf(domain, target),
        };
    }

    /// <summary>The claim that a quantity is its target or less.</summary>
    /// <param name="domain">The values the quantity can take.</param>
    /// <param name="target">The greatest value that is right, in the domain.</param>
    /// <param name="defect">How far above the target must be caught: a distance above 0.</param>
    /// <returns>Edges with an upper side only.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to
    /// catch.</exception>
    public static Edges AtMost(Domain domain, double target, double defect)
    {
        RequireTarget(domain, target);
        RequireDefect(defect);
        double caught = Plus(target, defect);
        RequireBelow(target, caught, defect);
        return new Edges(domain, target)
        {
            UpperEdge = UpperEdgeOf(domain, target),
            UpperDefect = Defect(domain, caught) ?? throw NothingToCatch(domain, caught),
        };
    }

    static void RequireTarget(Domain domain, double target)
    {
        if (domain is null)
            throw new ArgumentNullException(nameof(domain));
        if (!(target >= domain.Minimum && target <= domain.Maximum && Math.Abs(target) <= double.MaxValue))
            throw Refused($"The target must lie in {Text(domain)}; it is {Check.Text(target)}.");
    }

    static void RequireDefect(double defect)
    {
        if (!(defect > 0 && defect <= double.MaxValue))
            throw Refused($"The defect must be a distance above 0; it is {Check.Text(defect)}.");
    }

    static void RequireOrder(double lower, double target, double upper)
    {
        if (!(lower <= target && target <= upper))
            throw Refused($"The target ({Check.Text(target)}) must lie between the edges, "
                + $"{Check.Text(lower)} and {Check.Text(upper)}.");
    }

    static void RequireBeyond(double? edge, double? defect, bool beyond)
    {
        string rim = edge is { } value ? Check.Text(value) : "none given";
        if (defect is { } caught && !beyond)
            throw Refused($"The defect ({Check.Text(caught)}) must lie beyond its edge ({rim}).");
    }

    static void RequireBelow(double lower, double upper, double defect)
    {
        if (!(lower < upper))
            throw Refused($"The defect ({Check.Text(defect)}) cannot be told from the target or the tolerance "
                + "in double precision. Choose a larger one.");
    }

    static double? Defect(Domain domain, double value) =>
        value >= domain.Minimum && value <= domain.Maximum && Math.Abs(value) <= double.MaxValue ? value : null;

    static double? LowerEdgeOf(Domain domain, double value) => value > domain.Minimum ? value : null;

    static double? UpperEdgeOf(Domain domain, double value) => value < domain.Maximum ? value : null;

    static ClaimRefusedException NothingToCatch(Domain domain, double caught) =>
        Refused($"The defect, {Check.Text(caught)}, lies outside {Text(domain)}: there is nothing to catch. "
            + "Choose a smaller defect.");

    static ClaimRefusedException Refused(string message) => new(message);

    static string Text(Domain domain) => $"[{Check.Text(domain.Minimum)}, {Check.Text(domain.Maximum)}]";

    // 0.1 + 0.2 - 0.3 must be the edge 0: binary arithmetic would put a defect a hair outside the domain and drop its
    // side.
    static double Plus(double target, double distance) =>
        Decimals.Exact(target) is { } t && Decimals.Exact(distance) is { } d
            ? Decimals.Nearest(t + d)
            : target + distance;

    static double Minus(double target, double distance) =>
        Decimals.Exact(target) is { } t && Decimals.Exact(distance) is { } d
            ? Decimals.Nearest(t - d)
            : target - distance;
}
