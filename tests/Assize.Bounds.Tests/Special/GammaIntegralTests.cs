namespace Assize.Bounds.Tests.Special;

/// <summary>The integral against Legendre's fraction, and both of its sides against each other.</summary>
public class GammaIntegralTests
{
    const double Tolerance = 2e-14;

    static readonly double[] Shapes = [1e5, 123_456.7, 1e6, 1e7, 1e8];

    [Fact]
    public void Above_the_shape_it_is_the_continued_fraction()
    {
        foreach (double shape in Shapes)
        {
            foreach (double spreads in new[] { 1.0, 1.5, 3, 8, 30, 100 })
            {
                double point = shape + spreads * Math.Sqrt(shape);
                Assert.Equal(1, GammaIntegral.Upper(shape, point) / GammaFraction.Of(shape, point), Tolerance);
            }

            Assert.Equal(1, GammaIntegral.Upper(shape, 10 * shape) / GammaFraction.Of(shape, 10 * shape), Tolerance);
        }
    }

    // γ(a, x) + Γ(a, x) = Γ(a), divided by Γ(a + 1) / (x^a e^-x), which is one over a Poisson mass.
    [Fact]
    public void Both_sides_are_the_whole()
    {
        foreach (double shape in new[] { 1e5, 1e6, 1e7 })
        {
            foreach (double spreads in new[] { -1.0, -0.3, 0, 0.5, 1, 2 })
            {
                double point = shape + spreads * Math.Sqrt(shape);
                double both = GammaIntegral.Lower(shape, point) + GammaIntegral.Upper(shape, point);
                Assert.Equal(1, both * shape * Math.Exp(Poisson.LogMass(point, (long)shape)), 1e-12);
            }
        }
    }

    [Fact]
    public void Next_to_the_least_shape_series_and_integral_agree()
    {
        const double below = GammaIntegral.LeastShape * (1 - 1e-12);
        foreach (double share in new[] { 0.5, 0.9, 0.99, 0.999, 1, 1.002 })
        {
            double point = share * GammaIntegral.LeastShape;
            double series = IncompleteGamma.LogLowerTail(below, point);
            double integral = IncompleteGamma.LogLowerTail(GammaIntegral.LeastShape, point);
            Assert.Equal(1, integral / series, 1e-9);
        }
    }
}
