using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>Two one-sided assertions on one counter are one band: joined at the first of them.</summary>
static class Pairing
{
    public static IEnumerable<Requirement> Of(IReadOnlyList<Requirement> requirements)
    {
        var taken = new HashSet<Requirement>();
        for (int at = 0; at < requirements.Count; at++)
        {
            Requirement first = requirements[at];
            if (taken.Contains(first))
                continue;
            Requirement? other = requirements.Skip(at + 1).FirstOrDefault(
                later => !taken.Contains(later) && ArePair(first, later));
            if (other is null)
            {
                yield return first;
                continue;
            }

            taken.Add(other);
            yield return first with { Condition = Both(first.Condition, other.Condition), TookRoot = first.TookRoot
                || other.TookRoot };
        }
    }

    static bool ArePair(Requirement first, Requirement second) =>
        first.Repeats == second.Repeats
        && Side(first) is { } a && Side(second) is { } b
        && a.Count == b.Count && a.IsUpper != b.IsUpper;

    static (Sum Count, bool IsUpper)? Side(Requirement requirement) =>
        EstimatorReader.Proportion(requirement.Condition) is { } estimate
        && Isolation.Solve(estimate.Condition, estimate.Count) is { } interval
        && interval.Low is null != interval.High is null
            ? (estimate.Count, interval.High is not null)
            : null;
}
