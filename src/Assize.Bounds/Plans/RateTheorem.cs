namespace Assize.Bounds;

/// <summary>A theorem that can size a rate plan. Every subclass in the assembly is found: a new one is one new
/// file.</summary>
abstract class RateTheorem
{
    public abstract string Name { get; }

    public abstract string Assumes { get; }

    /// <summary>From here on every number of trials is proven to meet the plan; null when none up to the cap
    /// is.</summary>
    /// <param name="plan">The plan, for its miss.</param>
    /// <param name="sides">The sides that have a defect to catch, one or two.</param>
    public abstract long? TrialsNeeded(RatePlan plan, IReadOnlyList<RateSide> sides);

    public static IEnumerable<RateTheorem> All() =>
        from type in typeof(RateTheorem).Assembly.GetTypes()
        where type.IsSubclassOf(typeof(RateTheorem)) && !type.IsAbstract
        orderby type.FullName
        select (RateTheorem)Activator.CreateInstance(type, nonPublic: true);

    /// <summary>The greater of what the sides need; null when one of them finds no number.</summary>
    protected static long? Greatest(IReadOnlyList<RateSide> sides, Func<RateSide, long?> needed)
    {
        long?[] trials = [.. sides.Select(needed)];
        return Array.TrueForAll(trials, number => number is not null) ? trials.Max() : null;
    }

    /// <summary>The first number of trials that suffices, when every larger one does; null beyond the cap.</summary>
    public static long? First(double guess, Func<long, bool> suffices)
    {
        const long most = RatePlan.MaximumTrials;
        long found = IntegerSearch.First(1, most, (long)Math.Min(guess, most), suffices);
        return found <= most ? found : null;
    }
}
