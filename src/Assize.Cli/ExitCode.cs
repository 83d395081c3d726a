namespace Assize.Cli;

/// <summary>What the tool tells the script that called it.</summary>
enum ExitCode
{
    /// <summary>Tests green, budget and findings kept.</summary>
    Kept = 0,

    /// <summary>At least one test is red.</summary>
    Red = 1,

    /// <summary>Tests green, but the budget is exceeded or a finding stands.</summary>
    NotKept = 2,

    /// <summary>The job could not be done: bad arguments, a build that failed, an unreadable ledger.</summary>
    CouldNotRun = 3,
}
