namespace Assize;

/// <summary>What holds for every claim of a test assembly that does not say otherwise. The environment goes before it
/// (ASSIZE_RISK, ASSIZE_CONFIDENCE, ASSIZE_SEED), and a claim's own WithRisk and WithConfidence before both.</summary>
[AttributeUsage(AttributeTargets.Assembly)]
public sealed class SuiteTermsAttribute : Attribute
{
    /// <summary>The probability of a false failure allowed to one claim in one run, in [1e-300, 1); 0 for the usual 1e-9.</summary>
    public double Risk { get; set; }

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1); 0 for the usual 0.999.</summary>
    public double Confidence { get; set; }

    /// <summary>The seed of every run, 1 to 16 hexadecimal digits; null for a fresh one in each process. A fixed seed makes the
    /// suite repeat itself: what it misses once, it misses always.</summary>
    public string? Seed { get; set; }
}
