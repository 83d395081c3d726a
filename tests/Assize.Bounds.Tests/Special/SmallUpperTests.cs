namespace Assize.Bounds.Tests;

public class SmallUpperTests
{
    // As the shape falls to 0, Q(a, x)/a tends to the exponential integral E₁(x).
    // M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964), table 5.1: E₁(0.5) = 0.559773595.
    [Fact]
    public void A_vanishing_shape_gives_the_exponential_integral() =>
        Assert.Equal(0.559773595, Math.Exp(SmallUpper.Log(1e-10, 0.5)) * 1e10, 1e-9);

    // Q(½, x) = erfc √x.
    [Fact]
    public void Shape_one_half_gives_the_error_function()
    {
        for (double point = 0.25; point < 1; point += 0.01)
            Assert.Equal(1, Math.Exp(SmallUpper.Log(0.5, point))
                / MathNet.Numerics.SpecialFunctions.Erfc(Math.Sqrt(point)), 1e-13);
    }
}
