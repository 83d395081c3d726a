using System.CommandLine;

namespace Assize.Cli;

sealed class PlanPage : ICommandPage
{
    public string Words => "plan";

    public Command Define(Desk desk) => new("plan", "The trials a claim costs and the rule that decides, without running any.");
}
