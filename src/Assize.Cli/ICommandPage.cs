using System.CommandLine;

namespace Assize.Cli;

/// <summary>One command of the tool: one class, one file, found by reflection.</summary>
interface ICommandPage
{
    /// <summary>The words that call it, for example "plan rate".</summary>
    string Words { get; }

    /// <summary>The command with its options and what it does.</summary>
    Command Define(Desk desk);
}
