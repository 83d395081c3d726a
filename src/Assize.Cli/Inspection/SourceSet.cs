using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace Assize.Cli;

/// <summary>Sources that are bound together.</summary>
/// <param name="Compilation">What binds them; it may hold errors.</param>
/// <param name="Tests">The trees that may hold tests or claims.</param>
/// <param name="Settings">What `.editorconfig` says of a tree.</param>
sealed record SourceSet(Compilation Compilation, IReadOnlyList<SyntaxTree> Tests, AnalyzerConfigOptionsProvider Settings);
