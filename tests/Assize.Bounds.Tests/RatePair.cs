namespace Assize.Bounds.Tests;

/// <summary>A row of plan_bounds: a rate against one or two defects, judged by the radius of a bound on a
/// mean.</summary>
static class RatePair
{
    public delegate double Radius(long trials, double variance, double bound, double risk);

    public static long Trials(ReferenceTable.Row row, Radius radius)
    {
        var (target, gap) = ((double)row.Decimal("p0"), (double)row.Decimal("tol"));
        var (risk, miss) = (row.Number("alpha"), row.Number("beta"));
        bool both = row.Text("kind") == "two_sided";
        double share = both ? risk / 2 : risk;
        long below = row.Text("kind") == "at_most" ? 1
            : First(n => Reach(n, target, target, share) + Reach(n, target - gap, 1 - target + gap, miss) <= gap);
        long above = row.Text("kind") == "at_least" ? 1
            : First(n => Reach(n, target, 1 - target, share) + Reach(n, target + gap, target + gap, miss) <= gap);
        return Math.Max(below, above);

        double Reach(long n, double rate, double bound, double probability) =>
            radius(n, rate * (1 - rate), bound, probability);
    }

    static long First(Func<long, bool> holds)
    {
        long high = 1;
        while (!holds(high))
            high *= 2;

        for (long low = high / 2; high - low > 1;)
        {
            long middle = low + (high - low) / 2;
            (low, high) = holds(middle) ? (low, middle) : (middle, high);
        }

        return high;
    }
}
