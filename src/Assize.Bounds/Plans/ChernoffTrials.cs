namespace Assize.Bounds;

/// <summary>From how many trials on a side works, by Chernoff's bound alone.</summary>
static class ChernoffTrials
{
    // Well above rounding: a number of trials must never be too small.
    const double Slack = 1e-12;

    /// <summary>The number for one side; null beyond the cap.</summary>
    public static long? Ceiling(RateSide side, double miss)
    {
        double trials = Of(side.Edge, side.Defect, side.Risk, miss) * (1 + Slack);
        return trials <= RatePlan.MaximumTrials ? (long)Math.Ceiling(trials) : null;
    }

    /// <summary>
    /// At some rate x between edge and defect, n·KL(x‖edge) ≥ ln(1/risk) and n·KL(x‖defect) ≥ ln(1/miss): a limit at
    /// n·x meets both,
    /// for this and every larger n.
    /// </summary>
    static double Of(double edge, double defect, double risk, double miss)
    {
        double red = -Elementary.Log(risk);
        double green = -Elementary.Log(miss);
        if (edge is 0 or 1)
            return defect is 0 or 1 ? 1 : green / -Elementary.LogOnePlus(edge == 0 ? -defect : -(1 - defect));
        if (defect is 0 or 1)
            return red / -(defect == 1 ? Elementary.Log(edge) : Elementary.LogOnePlus(-edge));

        double lower = Math.Min(edge, defect);
        double upper = Math.Max(edge, defect);
        var (cut, _) = RootBracket.Find(
            x => Divergence.Bernoulli(x, edge) / red - Divergence.Bernoulli(x, defect) / green, lower, upper, 1e-12);
        return Math.Max(red / Divergence.Bernoulli(cut, edge), green / Divergence.Bernoulli(cut, defect));
    }
}
