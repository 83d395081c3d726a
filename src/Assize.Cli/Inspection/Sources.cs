namespace Assize.Cli;

/// <summary>What a path given by the user turned out to hold.</summary>
/// <param name="Root">The folder that places are told from.</param>
/// <param name="ReadFrom">How the sources were read.</param>
/// <param name="Notes">What could not be read, and why.</param>
/// <param name="Sets">Sources, bound one set after the other: a set that has been read can be forgotten.</param>
sealed record Sources(string Root, string ReadFrom, List<string> Notes, IEnumerable<SourceSet> Sets);
