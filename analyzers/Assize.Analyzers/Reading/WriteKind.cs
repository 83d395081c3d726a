namespace Assize.Analyzers;

/// <summary>
/// How a variable changes. Opaque: by reference, from another function, or in a way that is not followed.
/// </summary>
enum WriteKind
{
    Set,
    Add,
    Subtract,
    Opaque,
}
