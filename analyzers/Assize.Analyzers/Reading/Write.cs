using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>One place at which a variable changes.</summary>
/// <param name="Kind">What happens to the variable.</param>
/// <param name="Site">The operation that writes.</param>
/// <param name="Value">What is set, added or subtracted; null for `++`, `--` and opaque writes.</param>
sealed record Write(WriteKind Kind, IOperation Site, IOperation? Value)
{
    public int Start => Site.Syntax.SpanStart;

    public int End => Site.Syntax.Span.End;
}
