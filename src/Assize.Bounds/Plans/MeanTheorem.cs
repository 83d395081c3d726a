namespace Assize.Bounds;

/// <summary>A theorem that can size a plan for a mean. Every subclass in the assembly is found: a new one is one new
/// file.</summary>
/// <remarks>
/// Each bounds P(average ≥ mean + margin) by inf E f(average) / f(mean + margin) over convex f. The average of more
/// draws is
/// a conditional expectation of the average of fewer, so such a bound falls, or stays, as trials are added (Jensen).
/// </remarks>
abstract class MeanTheorem
{
    public abstract string Name { get; }

    public abstract string Assumes { get; }

    /// <summary>Whether the facts are those the theorem takes for granted.</summary>
    public abstract bool Applies(MeanFacts facts);

    /// <summary>At least P(average ≥ mean + margin), for every distribution of these facts whose mean is this or
    /// less.</summary>
    public abstract double Beyond(MeanFacts facts, long trials, double mean, double margin);

    /// <summary>Whether a bound takes a sum over many terms, the more of them the more trials.</summary>
    public virtual bool IsCostly => false;

    public static IReadOnlyList<MeanTheorem> All { get; } =
    [
        .. from type in typeof(MeanTheorem).Assembly.GetTypes()
           where type.IsSubclassOf(typeof(MeanTheorem)) && !type.IsAbstract
           orderby type.FullName
           select (MeanTheorem)Activator.CreateInstance(type, nonPublic: true),
    ];

    /// <summary>The least margin that the average exceeds with no more than a probability, rounded up; none above the
    /// greatest one asked for is found.</summary>
    public double Margin(MeanFacts facts, long trials, double mean, double probability, double greatest)
    {
        if (!(Beyond(facts, trials, mean, greatest) <= probability))
            return double.PositiveInfinity;

        // The bound falls from 1 at margin 0: halve until both ends agree to 1e-9, and keep the safe one.
        double low = 0, high = greatest;
        while (high - low > 1e-9 * high)
        {
            double middle = low + (high - low) / 2;
            if (Beyond(facts, trials, mean, middle) <= probability)
                high = middle;
            else
                low = middle;
        }

        return high;
    }

    /// <summary>A bound on draw minus mean, for a mean of this or less, such that a smaller mean makes nothing
    /// worse.</summary>
    /// <remarks>
    /// The extreme law of given variance puts mass on mean + bound and mean - variance / bound. From bound ≥ deviation
    /// on, a
    /// greater mean under the same ceiling raises the low value and the mass of the high one: it dominates.
    /// </remarks>
    protected static double BoundAbove(MeanFacts facts, double mean) =>
        Math.Max(facts.Maximum!.Value - mean, facts.StandardDeviation!.Value);
}
