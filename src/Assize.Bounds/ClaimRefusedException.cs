namespace Assize.Bounds;

/// <summary>The numbers of a claim cannot be met, or a draw broke a fact: thrown before, or at, the draw
/// concerned.</summary>
public sealed class ClaimRefusedException : ArgumentException
{
    /// <summary>A refusal that names the value at fault and its cure.</summary>
    /// <param name="message">What was asked, why it cannot be met and what to write instead.</param>
    public ClaimRefusedException(string message) : base(message)
    {
    }
}
