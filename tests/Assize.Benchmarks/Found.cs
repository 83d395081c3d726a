namespace Assize.Benchmarks;

/// <summary>What this project holds of a kind, one type a file, so that nothing lists them by hand.</summary>
static class Found
{
    /// <summary>One of each type of the kind whose name contains one of the words; all without words.</summary>
    /// <exception cref="ArgumentException">A word names nothing.</exception>
    public static IReadOnlyList<T> Of<T>(IReadOnlyCollection<string> words)
    {
        var all = typeof(Found).Assembly.GetTypes()
            .Where(type => !type.IsAbstract && type.IsSubclassOf(typeof(T)))
            .OrderBy(type => type.Name, StringComparer.Ordinal)
            .ToArray();
        var unknown = words.Where(word => !all.Any(type => Names(type, word))).ToArray();
        return unknown is []
            ? [.. all.Where(type => words.Count == 0 || words.Any(word => Names(type, word))).Select(type => (T)Activator.CreateInstance(type)!)]
            : throw new ArgumentException($"'{unknown[0]}' names none of {string.Join(", ", all.Select(type => type.Name))}.");
    }

    static bool Names(Type type, string word) => type.Name.Contains(word, StringComparison.OrdinalIgnoreCase);
}
