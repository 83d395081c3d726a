namespace Assize.Analyzers;

/// <summary>The types whose arithmetic is replayed; everything else is <see cref="Other"/>.</summary>
enum NumberKind
{
    Other,
    Boolean,
    Int32,
    Int64,
    Single,
    Double,
    Decimal,
}
