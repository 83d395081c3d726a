namespace Assize.Bounds;

/// <summary>A theorem that can size a rate plan. Every subclass in the assembly is found: a new one is one new file.</summary>
abstract class RateTheorem
{
    public abstract string Name { get; }

    public abstract string Assumes { get; }

    /// <summary>From here on every number of trials catches one side's defect; null when none up to the cap does.</summary>
    public abstract long? TrialsNeeded(RateSide side, double miss);

    /// <summary>The same for a whole plan: its sides one by one, unless the theorem can do better.</summary>
    public virtual long? TrialsNeeded(RatePlan plan, IReadOnlyList<RateSide> sides)
    {
        long needed = 0;
        foreach (var side in sides)
        {
            if (!side.Catches)
                continue;
            if (TrialsNeeded(side, plan.Miss) is not { } trials)
                return null;

            needed = Math.Max(needed, trials);
        }

        return needed;
    }

    public static IEnumerable<RateTheorem> All() =>
        from type in typeof(RateTheorem).Assembly.GetTypes()
        where type.IsSubclassOf(typeof(RateTheorem)) && !type.IsAbstract
        orderby type.FullName
        select (RateTheorem)Activator.CreateInstance(type, nonPublic: true);

    /// <summary>The first number of trials that suffices, when every larger one does; null beyond the cap.</summary>
    public static long? First(double guess, Func<long, bool> suffices)
    {
        long found = IntegerSearch.First(1, RatePlan.MaximumTrials, (long)Math.Min(guess, RatePlan.MaximumTrials), suffices);
        return found <= RatePlan.MaximumTrials ? found : null;
    }
}
