using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>One claim and one way its draws may be distributed.</summary>
/// <param name="Name">The claim and the law, in a few words.</param>
/// <param name="Edges">The claim's edges; the truth is moved along the quantity they bound.</param>
/// <param name="FixedTrials">The trials of the fixed plan.</param>
/// <param name="Judge">The claim judged once on draws of a truth.</param>
sealed record CalibratedLaw(string Name, Edges Edges, long FixedTrials, Func<double, Verdict> Judge)
{
    const double Risk = 0.05;

    /// <summary>Both promises: the risk, and one minus the confidence.</summary>
    public static double Promise => Risk;

    /// <summary>What a draw tells one truth from another by (Kullback–Leibler); null where it is not known.</summary>
    public Func<double, double, double>? Information { get; init; }

    /// <summary>Where the truth is put: upwards from the target, or downwards.</summary>
    public bool IsDownwards { get; init; }

    /// <summary>A claim judged on draws of a truth.</summary>
    public static CalibratedLaw Of<TDraw>(
        string name, Claim<TDraw> claim, Edges edges, Func<Random, double, TDraw> draw)
    {
        var loose = Loose(claim, name);
        return new(name, edges, loose.Plan().FixedTrials, truth => loose.Judge(rng => draw(rng, truth)));
    }

    /// <summary>A claim that two sources are alike, judged on draws of two truths apart.</summary>
    public static CalibratedLaw Of<TDraw>(
        string name, Comparison<TDraw> claim, Edges edges, Func<Random, double, TDraw> one, Func<Random, TDraw> other)
    {
        var loose = Loose(claim, name);
        return new(name, edges, loose.Plan().FixedTrials, truth => loose.Judge(rng => one(rng, truth), other));
    }

    // The name keeps the streams of different rows apart; occurrences number the repetitions.
    static TClaim Loose<TClaim>(TClaim claim, string name) where TClaim : Claim =>
        claim.WithRisk(Risk).WithConfidence(1 - Risk).Named(name);

    /// <summary>What may be true: the words for it, its value, and which colour would be wrong there.</summary>
    public IEnumerable<(string Place, double Truth, Outcome? Wrong)> Truths()
    {
        double edge = (IsDownwards ? Edges.LowerEdge : Edges.UpperEdge)!.Value;
        double defect = (IsDownwards ? Edges.LowerDefect : Edges.UpperDefect)!.Value;
        yield return ("target", Edges.Target, Outcome.Refuted);
        yield return ("tolerance", edge, Outcome.Refuted);
        yield return ("grey zone", (edge + defect) / 2, null);
        yield return ("defect", defect, Outcome.Upheld);
        yield return ("2 defects", 2 * defect - Edges.Target, Outcome.Upheld);
    }

    /// <summary>No procedure with both error probabilities takes fewer trials on average at this truth; null where it is not
    /// known. A. Wald, Ann. Math. Statist. 16 (1945) 117–186: the expected information is at least that of the verdict.</summary>
    public double? LeastTrials(double truth, Outcome? wrong)
    {
        if (Information is null || wrong is null)
            return null;
        double needed = (1 - 2 * Risk) * Math.Log((1 - Risk) / Risk);
        double?[] others = wrong == Outcome.Refuted ? [Edges.LowerDefect, Edges.UpperDefect]
            : [IsDownwards ? Edges.LowerEdge : Edges.UpperEdge];
        return others.Max(other => other is { } there ? needed / Information(truth, there) : null);
    }
}
