namespace Assize;

/// <summary>Where in the sources a claim is judged.</summary>
/// <param name="TrialText">The trial as it is written.</param>
/// <param name="Member">The calling member.</param>
/// <param name="File">The full path of the source file.</param>
/// <param name="Line">The line, counted from 1.</param>
/// <param name="Replay">What a seed can bring back.</param>
sealed record Site(string TrialText, string Member, string File, int Line, Replay Replay)
{
    /// <summary>Whether the seed brings the draws back.</summary>
    public bool CanReplay => Replay is Replay.Trial or Replay.Batch;
}
