namespace Assize.Bounds;

/// <summary>How many trials a claim takes if one theorem alone must prove the plan.</summary>
/// <param name="Name">The theorem, as its page is titled.</param>
/// <param name="Trials">From this number on every number of trials suffices; null when no number up to 1e15
/// does.</param>
/// <param name="Assumes">What the theorem takes for granted about the draws.</param>
public sealed record TheoremTrials(string Name, long? Trials, string Assumes);
