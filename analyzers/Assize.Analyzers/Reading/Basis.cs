namespace Assize.Analyzers;

/// <summary>Where it is known from what right code draws.</summary>
enum Basis
{
    /// <summary>The generator and all that is done with its draws are in sight.</summary>
    Law,

    /// <summary>The author says so in a hint.</summary>
    Hint,

    /// <summary>The assertion's own target is taken to be right.</summary>
    Target,
}
