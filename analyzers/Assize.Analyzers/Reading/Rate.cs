namespace Assize.Analyzers;

/// <summary>The probability of success on healthy code.</summary>
/// <param name="Value">The rate, in (0, 1).</param>
/// <param name="Basis">Where it is known from.</param>
sealed record Rate(double Value, Basis Basis);
