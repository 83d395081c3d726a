using Assize.Bounds;
using Microsoft.CodeAnalysis;

namespace Assize.Analyzers;

/// <summary>A hand-written assertion on a count of successes, and how often it is red on healthy code.</summary>
sealed record AssertionReading(Location Location, Location? TrialsLiteral) : Reading(Location, TrialsLiteral)
{
    /// <summary>Trials behind one evaluation.</summary>
    public required long Trials { get; init; }

    /// <summary>The least count that passes, by the assertion's own arithmetic.</summary>
    public required long AcceptLow { get; init; }

    /// <summary>The greatest count that passes.</summary>
    public required long AcceptHigh { get; init; }

    /// <summary>The band as shares of the trials.</summary>
    public required ProportionBand Shares { get; init; }

    /// <summary>Whether more trials at the same band help; not when the band is made of standard errors.</summary>
    public required bool MoreTrialsHelp { get; init; }

    /// <summary>The rate on healthy code.</summary>
    public required Rate Rate { get; init; }

    /// <summary>Half the width the author meant; 0 where no centre was meant.</summary>
    public required double Tolerance { get; init; }

    /// <summary>How often the assertion is evaluated in one run, and whether all must pass or one.</summary>
    public required Runs Runs { get; init; }

    /// <summary>Where the randomness begins.</summary>
    public required Seeding Seeding { get; init; }

    /// <summary>The data row, where the test has parameters: the one that is red most often.</summary>
    public required string? Row { get; init; }

    /// <summary>The probability that one run of the test is red at this assertion although the code is right.</summary>
    public required Enclosure FalseFailure { get; init; }

    /// <summary>Trials from which on the same band of shares is red seldom enough; null when it never is.</summary>
    public long? TrialsNeeded(double risk) =>
        MoreTrialsHelp
            ? Question.Ask(() => ProportionAssessment.TrialsNeeded(Shares, Rate.Value, Chance.OfOneRun(risk, Runs)))
            : null;

    /// <summary>
    /// The nearest wrong rate that one evaluation catches with this confidence; null when there is none.
    /// </summary>
    public double? RateCaught(double confidence) =>
        Rate.Value + Question.Ask(() =>
            ProportionAssessment.SmallestDefectCaught(Trials, AcceptLow, AcceptHigh, Rate.Value, confidence));
}
