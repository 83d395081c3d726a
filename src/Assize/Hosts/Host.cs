using System.Reflection;

namespace Assize;

/// <summary>A test framework, found at run time: no package of it is referenced. Each subclass is one file.</summary>
abstract class Host
{
    public static IReadOnlyList<Host> All { get; } =
    [
        .. typeof(Host).Assembly.GetTypes()
            .Where(type => type.IsSubclassOf(typeof(Host)))
            .OrderBy(type => type.Name, StringComparer.Ordinal)
            .Select(type => (Host)Activator.CreateInstance(type)!),
    ];

    /// <summary>The test that runs on this thread, or null when this framework runs none.</summary>
    public abstract HostContext? Context(Site site);

    /// <summary>A type of a framework that has been loaded; null when it has not.</summary>
    private protected static Type? Loaded(string assembly, string type) => AppDomain.CurrentDomain.GetAssemblies()
        .FirstOrDefault(loaded => string.Equals(loaded.GetName().Name, assembly, StringComparison.OrdinalIgnoreCase))?.GetType(type);

    /// <summary>The value at the end of a chain of properties; null as soon as one is null or missing.</summary>
    private protected static object? Follow(object? start, params ReadOnlySpan<string> properties)
    {
        foreach (string property in properties)
            start = start?.GetType().GetProperty(property, BindingFlags.Public | BindingFlags.Instance)?.GetValue(start);
        return start;
    }
}
