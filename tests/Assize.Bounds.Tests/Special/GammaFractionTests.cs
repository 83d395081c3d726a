namespace Assize.Bounds.Tests;

public class GammaFractionTests
{
    // Γ(1, x) = e^-x and Γ(3, x) = (x² + 2x + 2)e^-x end the fraction after one and three steps.
    [Fact]
    public void Whole_shapes_end_the_fraction()
    {
        for (double point = 4; point < 1e9; point *= 3)
        {
            Assert.Equal(1, GammaFraction.Of(1, point) * point, 1e-15);
            Assert.Equal(1, GammaFraction.Of(3, point) * point / (1 + 2 / point + 2 / (point * point)), 1e-15);
        }
    }

    // The asymptotic series 1 + (a - 1)/x + (a - 1)(a - 2)/x² + … for a point far beyond the shape.
    [Fact]
    public void A_far_point_gives_the_asymptotic_series()
    {
        const double shape = 0.3, point = 1e4;
        double series = 1 + (shape - 1) / point
            * (1 + (shape - 2) / point * (1 + (shape - 3) / point * (1 + (shape - 4) / point)));

        Assert.Equal(series, GammaFraction.Of(shape, point) * point, 1e-15);
    }
}
