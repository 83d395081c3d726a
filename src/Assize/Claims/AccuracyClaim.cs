using Assize.Bounds;

namespace Assize;

public abstract partial record Claim
{
    /// <summary>An estimator keeps its promise: it errs by no more than an error with at least a probability.</summary>
    /// <param name="error">The greatest error promised, in [0, ∞); same unit as the estimates.</param>
    /// <param name="probability">The least probability promised, in (0, 1].</param>
    /// <param name="defect">How far below that probability must be caught: a distance above 0.</param>
    /// <returns>A claim about pairs of an estimate and the truth.</returns>
    /// <exception cref="ClaimRefusedException">A number lies outside its domain, is NaN, or leaves nothing to catch.</exception>
    public static AccuracyClaim Accuracy(double error, double probability, double defect) => new(error, probability, defect);
}

/// <summary>A claim that |estimate - truth| stays within an error, with at least a probability.</summary>
public sealed record AccuracyClaim : Claim<(double Estimate, double Truth)>
{
    internal AccuracyClaim(double error, double probability, double defect)
    {
        if (!(error >= 0 && double.IsFinite(error)))
            throw new ClaimRefusedException($"The error promised is a distance of 0 or more; it is {Wording.Exact(error)}.");

        (Error, Defect, Edges) = (error, defect, Edges.AtLeast(Domain.Rate, probability, defect));
    }

    /// <summary>The greatest error promised.</summary>
    public double Error { get; }

    /// <summary>How far below the probability is caught.</summary>
    public double Defect { get; }

    /// <summary>The probability promised and the one that is caught.</summary>
    public Edges Edges { get; }

    internal override string Sentence => $"an estimate errs by {Wording.Number(Error)} at most, with probability "
        + $"{Wording.Number(Edges.Target)} or more {Wording.Caught(Edges)}";

    internal override Statement Statement => new("accuracy", "rate", Edges.Target, 0, Defect, Edges);

    RateClaim AsRate => new(Edges, Edges.Target, 0, Defect) { Terms = Terms };

    /// <inheritdoc/>
    public override Plan Plan() => AsRate.Plan();

    // An estimate that is no number keeps no promise: the comparison is false for it.
    private protected override IRace<(double Estimate, double Truth)> Start() =>
        new MappedRace<(double Estimate, double Truth), bool>(AsRate.NewRace(), pair => Math.Abs(pair.Estimate - pair.Truth) <= Error);
}
