namespace Assize.Analyzers;

/// <summary>The probability of success on healthy code.</summary>
/// <param name="Value">The rate, in (0, 1).</param>
/// <param name="IsLaw">True where the code itself tells it, false where it is the assertion's own target.</param>
sealed record Rate(double Value, bool IsLaw);
