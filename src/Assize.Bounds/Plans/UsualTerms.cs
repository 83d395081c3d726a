namespace Assize.Bounds;

/// <summary>How surely a claim is judged when its author says nothing: the same for the compiler and the runtime.</summary>
public static class UsualTerms
{
    /// <summary>The probability of a false failure allowed to one claim in one run.</summary>
    public const double Risk = 1e-9;

    /// <summary>One minus the probability of a missed defect allowed.</summary>
    public const double Confidence = 0.999;
}
