using Assize.Bounds;

namespace Assize;

/// <summary>The numbers of a claim about one value, before it is known between which values it lies.</summary>
readonly record struct MeanNumbers(double Target, double Tolerance, double Defect, Func<Domain, Edges> In)
{
    public static MeanNumbers Around(double target, double tolerance, double? defect) =>
        Checked(new(target, tolerance, defect ?? 2 * tolerance, domain => Edges.Around(domain, target, tolerance, defect)));

    public static MeanNumbers AtLeast(double target, double defect) =>
        Checked(new(target, 0, defect, domain => Edges.AtLeast(domain, target, defect)));

    public static MeanNumbers AtMost(double target, double defect) =>
        Checked(new(target, 0, defect, domain => Edges.AtMost(domain, target, defect)));

    // What is wrong whatever the draws are, is said at once.
    static MeanNumbers Checked(MeanNumbers numbers)
    {
        numbers.In(Domain.Any);
        return numbers;
    }
}
