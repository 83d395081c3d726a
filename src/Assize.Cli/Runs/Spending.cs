namespace Assize.Cli;

/// <summary>What one test may spend of the budget in one run.</summary>
sealed record Spending(string Assembly, string Test, int Claims, double Risk, long Trials);
