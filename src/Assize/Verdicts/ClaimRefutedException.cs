namespace Assize;

/// <summary>A claim was refuted. Under NUnit the framework's own failure is raised instead: do not catch this type, use Judge.</summary>
public sealed class ClaimRefutedException : Exception, IAssertionException
{
    internal ClaimRefutedException(Verdict verdict) : base(verdict.ToString()) => Verdict = verdict;

    /// <summary>The verdict that failed the test.</summary>
    public Verdict Verdict { get; }
}
