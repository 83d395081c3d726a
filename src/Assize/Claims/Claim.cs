using Assize.Bounds;

namespace Assize;

/// <summary>A statement about the distribution of a draw, and how surely it must be judged. Immutable.</summary>
public abstract partial record Claim
{
    private protected Claim()
    {
    }

    internal Terms Terms { get; init; } = new();

    /// <summary>The probability of a false failure allowed in one run, in (0, 1). Default: the suite's, else 1e-9.</summary>
    public double Risk => Terms.Risk;

    /// <summary>One minus the probability of a missed defect allowed, in (0, 1). Default: the suite's, else 0.999.</summary>
    public double Confidence => Terms.Confidence;

    /// <summary>The name given by the author; null when history and stream follow the test's name.</summary>
    public string? Name => Terms.Name;

    /// <summary>What is claimed, in words, without a full stop.</summary>
    internal abstract string Sentence { get; }

    /// <summary>What is claimed, in numbers.</summary>
    internal abstract Statement Statement { get; }

    /// <summary>The exact number of trials the author asked for; null when the race decides how many.</summary>
    /// <param name="plan">The fixed plan, made only when it is needed.</param>
    private protected long? ExactTrials(Func<long> plan)
    {
        if (Terms.Trials is not { } trials)
            return null;
        if (Terms.TrialCap < trials)
            throw new ClaimRefusedException($"WithTrials({Wording.Literal(trials)}) cannot finish below "
                + $"WithTrialCap({Wording.Literal(Terms.TrialCap.Value)}): leave one of them out.");

        long needed = plan();
        return trials >= needed ? trials : throw new ClaimRefusedException(
            $"WithTrials({Wording.Literal(trials)}) is too few: {Sentence}, at risk {Wording.Number(Risk)} and confidence "
            + $"{Wording.Number(Confidence)}, takes {Wording.Number(needed)} trials. Write WithTrials({Wording.Literal(needed)}), "
            + "or leave it out: the race mostly needs fewer.");
    }

    /// <summary>The trials this claim costs and the rule that decides, without running any.</summary>
    /// <returns>The plan, the same for every run.</returns>
    /// <exception cref="ClaimRefusedException">Risk and confidence cannot be met.</exception>
    public abstract Plan Plan();

    /// <summary>What is claimed, in words.</summary>
    /// <returns>One sentence without a full stop.</returns>
    public sealed override string ToString() => Sentence;
}
