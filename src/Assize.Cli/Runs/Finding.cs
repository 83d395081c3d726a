namespace Assize.Cli;

/// <summary>What the analyzer said about one place in the sources.</summary>
/// <param name="Rule">The rule's id.</param>
/// <param name="Level">"error", "warning" or "note".</param>
/// <param name="Message">The rule's text, numbers included.</param>
/// <param name="File">Full path of the source file.</param>
/// <param name="Line">Line, counted from 1.</param>
sealed record Finding(string Rule, string Level, string Message, string File, int Line)
{
    /// <summary>Whether it stands against the run; a note only informs.</summary>
    public bool Stands => Level is "error" or "warning";
}
