namespace Assize;

/// <summary>When bets are sized anew: by the number of the trial alone, so that blocks and threads change
/// nothing.</summary>
static class Stretch
{
    /// <summary>Trials between two sizes, after the first stretch.</summary>
    public const int Length = 16;

    /// <summary>Whether the bets on the trial after so many are sized anew.</summary>
    public static bool EndsAfter(long trials) => trials < Length || trials % Length == 0;
}
