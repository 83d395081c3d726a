namespace Assize.Bounds;

/// <summary>Claims that a thing never happens, or always does: one contrary draw refutes them, so no risk is
/// spent.</summary>
public static class ZeroFailures
{
    /// <summary>Whether a claim is one that a single contrary draw refutes.</summary>
    /// <param name="edges">The edges of a claim about a rate.</param>
    /// <returns>True for a target of 0 or 1 with tolerance 0.</returns>
    public static bool Applies(Edges edges)
    {
        if (edges is null)
            throw new ArgumentNullException(nameof(edges));

        return edges.UpperEdge == 0 || edges.LowerEdge == 1;
    }

    /// <summary>How many trials without a failure show that failures are rarer than the defect.</summary>
    /// <param name="defect">The rate of failures that must be caught, in (0, 1].</param>
    /// <param name="miss">The probability allowed of seeing no failure at that rate, in (0, 1).</param>
    /// <returns>⌈ln miss / ln(1 - defect)⌉, at least 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static long TrialsNeeded(double defect, double miss)
    {
        Check.Between(defect, double.Epsilon, 1, nameof(defect));
        Check.Inside(miss, 0, 1, nameof(miss));
        if (defect == 1)
            return 1;

        double trials = Elementary.Log(miss) / Elementary.LogOnePlus(-defect);
        if (!(trials < RatePlan.MaximumTrials))
            throw RatePlan.TooManyTrials();

        return IntegerSearch.First(
            1, RatePlan.MaximumTrials, (long)trials, n => RateSide.Within(Binomial.LowerTail(n, 0, defect), miss));
    }
}
