namespace Assize.Cli;

/// <summary>The job cannot be done, for a reason the user can mend: its message says which and how.</summary>
sealed class CouldNotRunException(string message) : Exception(message);
