using Assize.Bounds;

namespace Assize;

/// <summary>How a claim is to be judged. Every method returns a new claim of the same type.</summary>
// Classic `this` methods: an analyzer built on Roslyn 4.11 sees calls of extension blocks as instance calls on a nameless type.
public static class ClaimTerms
{
    /// <summary>Sets the probability of a false failure allowed in one run.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="risk">The risk, in [1e-300, 1).</param>
    /// <returns>The claim with this risk.</returns>
    /// <exception cref="ClaimRefusedException">The risk lies outside its domain, or is NaN.</exception>
    public static TClaim WithRisk<TClaim>(this TClaim claim, double risk) where TClaim : Claim => risk is >= 1e-300 and < 1
        ? With(claim, terms => terms with { Risk = risk })
        : throw Refused($"The risk must lie between 1e-300 and 1; it is {Wording.Exact(risk)}. Usual is 1e-9.");

    /// <summary>Sets how surely a defect must be caught.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="confidence">One minus the probability of a missed defect, in (0, 1).</param>
    /// <returns>The claim with this confidence.</returns>
    /// <exception cref="ClaimRefusedException">The confidence lies outside its domain, or is NaN.</exception>
    public static TClaim WithConfidence<TClaim>(this TClaim claim, double confidence) where TClaim : Claim => confidence is > 0 and < 1
        ? With(claim, terms => terms with { Confidence = confidence })
        : throw Refused($"The confidence must lie between 0 and 1; it is {Wording.Exact(confidence)}. Usual is 0.999.");

    /// <summary>Runs exactly this many trials under the fixed plan; refused before the first when they are too few.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="exactly">Number of trials, at least the fixed plan's.</param>
    /// <returns>The claim under the fixed plan.</returns>
    /// <exception cref="ClaimRefusedException">The number is below 1.</exception>
    public static TClaim WithTrials<TClaim>(this TClaim claim, long exactly) where TClaim : Claim => exactly >= 1
        ? With(claim, terms => terms with { Trials = exactly })
        : throw Refused($"WithTrials needs 1 trial or more; it is {exactly}.");

    /// <summary>Stops the race after so many trials; undecided then, the test fails unless the claim may stay undecided.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="trials">The most trials to run, at least 1.</param>
    /// <returns>The claim with this cap.</returns>
    /// <exception cref="ClaimRefusedException">The number is below 1.</exception>
    public static TClaim WithTrialCap<TClaim>(this TClaim claim, long trials) where TClaim : Claim => trials >= 1
        ? With(claim, terms => terms with { TrialCap = trials })
        : throw Refused($"WithTrialCap needs 1 trial or more; it is {trials}.");

    /// <summary>Stops the race after so much time; undecided then, the test fails unless the claim may stay undecided.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="time">The most time to spend, above 0.</param>
    /// <returns>The claim with this cap.</returns>
    /// <exception cref="ClaimRefusedException">The time is not above 0.</exception>
    public static TClaim WithTimeCap<TClaim>(this TClaim claim, TimeSpan time) where TClaim : Claim => time > TimeSpan.Zero
        ? With(claim, terms => terms with { TimeCap = time })
        : throw Refused($"WithTimeCap needs a time above 0; it is {time}.");

    /// <summary>Leaves the test green, and says so, when a cap stops the race.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <returns>A claim that a cap may leave undecided.</returns>
    public static TClaim MayStayUndecided<TClaim>(this TClaim claim) where TClaim : Claim =>
        With(claim, terms => terms with { MayStayUndecided = true });

    /// <summary>Runs trials on several threads; the verdict is the same as on one.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="threads">Number of threads, or 0 for one a processor.</param>
    /// <returns>The claim on several threads.</returns>
    /// <exception cref="ClaimRefusedException">The number is negative.</exception>
    public static TClaim InParallel<TClaim>(this TClaim claim, int threads = 0) where TClaim : Claim => threads >= 0
        ? With(claim, terms => terms with { Threads = threads == 0 ? Environment.ProcessorCount : threads })
        : throw Refused($"InParallel needs a number of threads, or 0 for one a processor; it is {threads}.");

    /// <summary>Lets a token end the trials early.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="token">Cancelled, it ends the trials with an OperationCanceledException.</param>
    /// <returns>The claim with this token.</returns>
    public static TClaim StoppedBy<TClaim>(this TClaim claim, CancellationToken token) where TClaim : Claim =>
        With(claim, terms => terms with { Stop = token });

    /// <summary>Says where the verdict's line goes, where no framework is found to tell.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="output">Takes one line.</param>
    /// <returns>The claim with this output.</returns>
    public static TClaim WrittenTo<TClaim>(this TClaim claim, Action<string> output) where TClaim : Claim
    {
        ArgumentNullException.ThrowIfNull(output);
        return With(claim, terms => terms with { Output = output });
    }

    /// <summary>Gives the claim a name that stays when the test is renamed or moved: history and stream follow it.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="name">The name, not empty; one for each claim of a suite.</param>
    /// <returns>The claim with this name.</returns>
    /// <exception cref="ClaimRefusedException">The name is empty.</exception>
    public static TClaim Named<TClaim>(this TClaim claim, string name) where TClaim : Claim => string.IsNullOrWhiteSpace(name)
        ? throw Refused("Named needs a name that is not empty.")
        : With(claim, terms => terms with { Name = name });

    /// <summary>Runs one trial alone, for the debugger; the claim is not judged, and the test stays red until this is taken out.</summary>
    /// <typeparam name="TClaim">The type of the claim.</typeparam>
    /// <param name="claim">The claim.</param>
    /// <param name="replayKey">The key that a failure text printed.</param>
    /// <returns>The claim reduced to this trial.</returns>
    /// <exception cref="ClaimRefusedException">The text is no replay key.</exception>
    public static TClaim OnlyTrial<TClaim>(this TClaim claim, string replayKey) where TClaim : Claim
    {
        ArgumentNullException.ThrowIfNull(replayKey);
        var key = ReplayKey.Parse(replayKey);
        return With(claim, terms => terms with { OnlyTrial = key });
    }

    static TClaim With<TClaim>(TClaim claim, Func<Terms, Terms> change) where TClaim : Claim
    {
        ArgumentNullException.ThrowIfNull(claim);
        return (TClaim)(claim with { Terms = change(claim.Terms) });
    }

    static ClaimRefusedException Refused(string message) => new(message);
}
