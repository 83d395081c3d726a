using MathNet.Numerics.Distributions;

namespace Assize;

/// <summary>Cumulative functions of library distributions, which need not answer outside their own values.</summary>
static class Cumulative
{
    public static Func<double, double> Of(IUnivariateDistribution law)
    {
        var (least, greatest) = law switch
        {
            IDiscreteDistribution points => (points.Minimum, points.Maximum == int.MaxValue ? double.PositiveInfinity : points.Maximum),
            IContinuousDistribution slope => (slope.Minimum, slope.Maximum),
            _ => (double.NegativeInfinity, double.PositiveInfinity),
        };
        // Between whole numbers nothing is added; a library's Poisson cumulative is a smooth curve there.
        bool isDiscrete = law is IDiscreteDistribution;
        return point => point < least ? 0 : point >= greatest ? 1
            : law.CumulativeDistribution(isDiscrete ? Math.Floor(point) : point);
    }
}
