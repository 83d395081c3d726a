namespace Assize;

/// <summary>How a claim was judged.</summary>
public enum Outcome
{
    /// <summary>No defect: what is at the defect or beyond is upheld with probability 1 - confidence at most.</summary>
    Upheld,

    /// <summary>Not as claimed: what is within tolerance is refuted with probability risk at most.</summary>
    Refuted,

    /// <summary>A cap set by the author stopped the trials before either could be said.</summary>
    Undecided,
}
