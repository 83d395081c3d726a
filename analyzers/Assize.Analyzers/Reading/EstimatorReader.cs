using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>Which statistic a condition is about.</summary>
static class EstimatorReader
{
    /// <summary>The condition in terms of one counter of successes; null when it is about anything else.</summary>
    public static (Term Condition, Sum Count)? Proportion(Term condition)
    {
        var sums = condition.Parts().OfType<Sum>().Distinct().ToList();
        // A hit counter and its complement are one statistic: misses = trials − hits.
        if (sums.Count == 2 && IsComplement(sums[0], sums[1]))
        {
            condition = condition.With(sums[1], Rest(sums[0]));
            sums.RemoveAt(1);
        }

        return sums.Count == 1 && IsCounter(sums[0]) && !OutsideDraws(condition, sums[0]) ? (condition, sums[0]) : null;
    }

    static bool IsCounter(Sum sum) => sum.Each is If choice && IsOne(choice.Then) && IsZero(choice.Else);

    static bool IsComplement(Sum hits, Sum misses) =>
        IsCounter(hits) && IsCounter(misses) && hits.Loops.Equals(misses.Loops) && hits.Kind == misses.Kind
        && Not(((If)hits.Each).Condition) == ((If)misses.Each).Condition;

    static Term Rest(Sum hits) => Arithmetic.Convert(hits.Kind, hits.Passes) is { } trials
        ? Of(Operator.Subtract, hits.Kind, new Known(trials), hits)
        : new Unknown("too many trials for the counter");

    // A bound that is itself drawn is no bound.
    static bool OutsideDraws(Term condition, Sum count) => condition.With(count, Zero(count.Kind)).Parts()
        .Any(part => part is Draw or Unknown);
}
