namespace Assize.Analyzers;

/// <summary>Where the randomness of a draw begins, the most restrictive kind last.</summary>
enum Seeding
{
    /// <summary>In the code under test, which makes its own generator.</summary>
    Inside,

    /// <summary>A generator shared by the process.</summary>
    Shared,

    /// <summary>A cryptographic generator.</summary>
    Cryptographic,

    /// <summary>A generator made without a seed.</summary>
    Fresh,

    /// <summary>A generator seeded from a clock or an identifier.</summary>
    TimeBased,

    /// <summary>The same draws in every run.</summary>
    Pinned,

    /// <summary>Not followed: it may be pinned.</summary>
    Unclear,
}
