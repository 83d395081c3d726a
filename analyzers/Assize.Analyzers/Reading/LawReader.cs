using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Operations;
using static Assize.Analyzers.Term;

namespace Assize.Analyzers;

/// <summary>
/// The rate of a yes/no draw on healthy code: exact where the generator is in sight, else the assertion's own target.
/// </summary>
sealed class LawReader
{
    // More values than this are not counted one by one.
    const long MostValues = 65_536;

    readonly Evaluator _evaluator;
    readonly DrawReader _draws;
    readonly RandomTypes _types;

    public LawReader(Evaluator evaluator, DrawReader draws, RandomTypes types) =>
        (_evaluator, _draws, _types) = (evaluator, draws, types);

    /// <summary>
    /// The rate of a band's counter; null when its draws are not surely random, independent and alike, or no rate is
    /// known.
    /// </summary>
    public Rate? Read(CountBand band)
    {
        Term condition = ((If)band.Count.Each).Condition;
        var draws = condition.Parts().OfType<Draw>().Distinct().ToList();
        var passes = band.Count.Loops.Items;
        if (draws.Count == 0 || !draws.TrueForAll(draw => _draws.IsOnePerPass(draw.Code, passes)))
            return null;
        if (draws.Count == 1 && Exact(condition, draws[0]) is { } exact)
            return IsPlausible(exact, band) ? new Rate(exact, Basis.Law) : null;
        return band.Centre is { } centre ? new Rate(centre, Basis.Target) : null;
    }

    // A law outside the band would mean a test that is always red: rather something was misread.
    static bool IsPlausible(double rate, CountBand band) =>
        rate is > 0 and < 1 && rate * band.Count.Passes >= band.Low && rate * band.Count.Passes <= band.High;

    double? Exact(Term condition, Draw draw)
    {
        if (draw.Code is not IInvocationOperation call || !_types.IsRandom(call.TargetMethod.ContainingType)
            || !_draws.IsPlainGenerator(call.Instance))
            return null;
        return call.TargetMethod.Name switch
        {
            "NextDouble" => Uniform(condition, draw),
            "Next" when call.Arguments.Length == 1 && Whole(call, 0) is { } end => Counted(condition, draw, 0, end),
            "Next" when call.Arguments.Length == 2 && Whole(call, 0) is { } start && Whole(call, 1) is { } end =>
                Counted(condition, draw, start, end),
            _ => null,
        };
    }

    static double? Uniform(Term condition, Draw draw)
    {
        if (Isolation.Solve(condition, draw) is not { } where)
            return null;
        return Math.Max(0, Math.Min(1, where.High ?? 1) - Math.Max(0, where.Low ?? 0));
    }

    // Every value is tried in C# arithmetic: no shape of condition has to be known.
    static double? Counted(Term condition, Draw draw, long start, long end)
    {
        if (end <= start || end - start > MostValues)
            return null;
        long hits = 0;
        for (long value = start; value < end; value++)
        {
            if (condition.With(draw, new Known((int)value)) is not Known { Value: bool hit })
                return null;
            hits += hit ? 1 : 0;
        }

        return hits / (double)(end - start);
    }

    long? Whole(IInvocationOperation call, int ordinal) =>
        call.Arguments.FirstOrDefault(argument => argument.Parameter?.Ordinal == ordinal) is { } argument
        && _evaluator.Read(argument.Value) is Known { Value: int value }
            ? value
            : null;
}
