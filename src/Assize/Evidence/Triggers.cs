namespace Assize;

/// <summary>The counts of successes at which something may happen in a race; each only grows with the trials.</summary>
/// <param name="RedFrom">The least count at which the claim may be refuted from above.</param>
/// <param name="RedTo">The greatest count at which the claim may be refuted from below.</param>
/// <param name="NotAboveTo">The greatest count at which a defect above may be excluded.</param>
/// <param name="NotBelowFrom">The least count at which a defect below may be excluded.</param>
sealed record Triggers(long RedFrom, long RedTo, long NotAboveTo, long NotBelowFrom);
