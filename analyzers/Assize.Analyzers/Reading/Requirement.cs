using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>What one assertion demands.</summary>
/// <param name="Condition">What must hold, in the arithmetic of the source.</param>
/// <param name="Meant">The same in the author's terms, where the assertion rounds; null where they agree.</param>
/// <param name="Site">Where a red assertion would be reported.</param>
/// <param name="Repeats">How often the assertion runs in one run of the test, on fresh draws.</param>
/// <param name="TookRoot">Whether the band is made with a square root, hence moves with the trials.</param>
sealed record Requirement(Term Condition, Term? Meant, IOperation Site, long Repeats, bool TookRoot);
