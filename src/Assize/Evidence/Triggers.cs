namespace Assize;

/// <summary>At one number of trials, the counts of successes from which on a bet may have reached its level.</summary>
/// <param name="RedFrom">The least at which the claim may be refuted from above.</param>
/// <param name="RedTo">The greatest at which the claim may be refuted from below.</param>
/// <param name="NotAboveTo">The greatest at which a defect above may be excluded.</param>
/// <param name="NotBelowFrom">The least at which a defect below may be excluded.</param>
readonly record struct Triggers(long RedFrom, long RedTo, long NotAboveTo, long NotBelowFrom);
