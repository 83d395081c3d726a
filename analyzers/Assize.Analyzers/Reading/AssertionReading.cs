using Assize.Bounds;
using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A hand-written assertion on a statistic of many draws, and what it does on right and on wrong code.</summary>
sealed record AssertionReading(Location Location, Location? TrialsLiteral) : Reading(Location, TrialsLiteral)
{
    public required Statistic Statistic { get; init; }

    /// <summary>How the source comes to its statistic: one letter of the page on shapes.</summary>
    public required char Shape { get; init; }

    /// <summary>The answers of the core for one evaluation.</summary>
    public required Assessment Assessment { get; init; }

    /// <summary>Draws behind one evaluation.</summary>
    public required long Trials { get; init; }

    /// <summary>What passes, in the unit that is asserted on: successes for counts and shares, as the source's own
    /// arithmetic decides.</summary>
    public required Bounds.Band Accepted { get; init; }

    /// <summary>What was meant to pass, in the unit of the target: shares of the trials, averages.</summary>
    public required Bounds.Band Meant { get; init; }

    /// <summary>The value on right code, a rate for counts and an average for sums; null where there is none.</summary>
    public required double? Target { get; init; }

    public required Basis Basis { get; init; }

    /// <summary>Half the width the author meant, in the unit of the target; 0 where no centre was meant.</summary>
    public required double Tolerance { get; init; }

    /// <summary>Whether more trials at the same band help; not when the band is made of standard errors.</summary>
    public required bool MoreTrialsHelp { get; init; }

    /// <summary>How often the assertion is evaluated in one run, and whether all must pass or one.</summary>
    public required Runs Runs { get; init; }

    /// <summary>Where the randomness begins.</summary>
    public required Seeding Seeding { get; init; }

    /// <summary>The test framework, as its package is called.</summary>
    public required string Framework { get; init; }

    /// <summary>The test method with its type.</summary>
    public required string Method { get; init; }

    /// <summary>The data row, where the test has parameters: the one that is red most often.</summary>
    public required string? Row { get; init; }

    /// <summary>The framework's own assertion, where the place reported is a call of a helper.</summary>
    public Location? Inner { get; init; }

    /// <summary>The probability that one run of the test is red at this assertion although the code is right.</summary>
    public Enclosure FalseFailure => Chance.OfRun(Assessment.FalseFailure, Runs);

    /// <summary>Whether no draws at all make it red.</summary>
    public bool CannotFail => Assessment.FalseFailure.Upper == 0;

    /// <summary>Trials from which on the same band is red seldom enough; null when it never is, or none are known.</summary>
    public long? TrialsNeeded(double risk) => MoreTrialsHelp
        ? Question.Ask(() => Assessment.TrialsNeeded(Chance.OfOneRun(risk, Runs)))
        : null;

    /// <summary>The signed shift of the target from which on one evaluation is red with this confidence; null when there
    /// is none, or none is known.</summary>
    public double? DefectCaught(double confidence) => Question.Ask(() => Assessment.SmallestDefectCaught(confidence));

    /// <summary>The narrowest tolerance the trials afford; null when it is not known.</summary>
    public double? ToleranceAffordable(double risk) =>
        Question.Ask(() => Assessment.ToleranceAffordable(Chance.OfOneRun(risk, Runs)));
}
