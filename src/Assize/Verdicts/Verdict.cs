using System.Diagnostics;

namespace Assize;

/// <summary>How a claim was judged, and everything the trials showed.</summary>
public sealed record Verdict
{
    internal Verdict(Hearing hearing, RaceReport report, Outcome outcome, TimeSpan elapsed) =>
        (Hearing, Report, Outcome, Elapsed) = (hearing, report, outcome, elapsed);

    internal Hearing Hearing { get; }

    internal RaceReport Report { get; }

    /// <summary>The verdict itself.</summary>
    public Outcome Outcome { get; }

    /// <summary>Whether the claim was upheld.</summary>
    public bool IsUpheld => Outcome == Outcome.Upheld;

    /// <summary>The claim that was judged.</summary>
    public Claim Claim => Hearing.Claim;

    /// <summary>Trials that the verdict rests on; 0 only when a cap stopped it before the first.</summary>
    public long Trials => Report.Trials;

    /// <summary>The value observed of what is claimed: for a rate, the share of successes; NaN without a
    /// trial.</summary>
    public double Observed => Report.Observed;

    /// <summary>Contains the true value with the claim's confidence, whenever the trials stopped; NaN where the claim
    /// is about many values. It is not the race turned around.</summary>
    public (double Lower, double Upper) Interval => Report.Interval;

    /// <summary>The natural logarithm of the evidence that the claim is wrong; infinite when one draw proves it.</summary>
    public double LogEvidenceAgainstClaim => Report.LogEvidenceAgainstClaim;

    /// <summary>The natural logarithm of the evidence that there is no defect below; infinite when there can be none.</summary>
    public double LogEvidenceAgainstDefectBelow => Report.LogEvidenceAgainstDefectBelow ?? double.PositiveInfinity;

    /// <summary>The natural logarithm of the evidence that there is no defect above; infinite when there can be none.</summary>
    public double LogEvidenceAgainstDefectAbove => Report.LogEvidenceAgainstDefectAbove ?? double.PositiveInfinity;

    /// <summary>The seed of the run.</summary>
    public ulong Seed => Hearing.Seed;

    /// <summary>Whether the trials drew from the generator they were given, so that the seed brings them back.</summary>
    public bool CanReplay => Hearing.Site.CanReplay;

    /// <summary>The theorem that decided.</summary>
    public string Theorem => Report.Theorem;

    /// <summary>How long the trials took.</summary>
    public TimeSpan Elapsed { get; }

    /// <summary>What the claim costs.</summary>
    public Plan Plan => Hearing.Claim.Plan();

    /// <summary>The whole text: what was claimed, what was seen, how sure that is and what to run now.</summary>
    /// <returns>Several lines.</returns>
    public override string ToString() => VerdictText.Of(this);

    /// <summary>Fails the test, as MustHold would have, unless the claim was upheld.</summary>
    /// <exception cref="ClaimRefutedException">The claim was refuted, or stayed undecided and may not; under NUnit its own failure.</exception>
    [StackTraceHidden]
    public void MustBeUpheld()
    {
        if (Outcome == Outcome.Refuted || (Outcome == Outcome.Undecided && !Claim.Terms.MayStayUndecided))
            Hearing.Host.Fail(this);
    }
}
