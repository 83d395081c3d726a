namespace Assize.Cli;

/// <summary>What one rule says of an assertion or a claim.</summary>
/// <param name="Rule">The rule's id.</param>
/// <param name="Level">"error", "warning" or "note".</param>
/// <param name="Message">Its text, numbers included.</param>
sealed record InspectedFinding(string Rule, string Level, string Message)
{
    /// <summary>Whether it stands against the suite; a note only informs.</summary>
    public bool Stands => Level is "error" or "warning";
}
