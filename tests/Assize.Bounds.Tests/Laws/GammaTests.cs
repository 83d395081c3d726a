namespace Assize.Bounds.Tests;

public class GammaTests
{
    // In the logarithm of the value every gamma density falls off at both ends.
    [Theory]
    [InlineData(0.5, 1)]
    [InlineData(1, 2)]
    [InlineData(2.5, 0.01)]
    [InlineData(30, 1)]
    [InlineData(1e4, 3)]
    public void Moments_and_cumulants_agree_with_sums_over_the_density(double shape, double scale)
    {
        double root = Math.Sqrt(shape), centre = Math.Log(shape * scale);
        var grid = LawContract.Grid(
            centre - 45 / Math.Min(shape, root), centre + Math.Min(6, 45 / root), 1e-3 / Math.Max(1, root),
            Math.Exp, u => shape * (u - centre) - (Math.Exp(u) / scale - shape));

        LawContract.AgreesWithSums(
            Law.Gamma(shape, scale), grid, 2e-12, 0.3 / (scale * root), -3 / (scale * root), -1e-3 / (scale * root));
    }

    [Fact]
    public void An_exponential_draw_has_the_known_moments()
    {
        var law = Law.Exponential(2);

        Assert.Equal((2, 4), (law.Mean, law.Variance));
        // E|X - 1|³ = 12/e - 2 for a mean of 1.
        Assert.Equal(8 * (12 / Math.E - 2), law.ThirdAbsoluteCentralMoment, 1e-13);
        Assert.Equal(-Math.Log(1 - 2 * 0.2), law.LogMoment(0.2), 1e-15);
    }

    [Fact]
    public void A_law_of_large_shape_is_nearly_normal() => Assert.Equal(
        2 * Math.Sqrt(2 / Math.PI), Law.Gamma(1e9, 1).ThirdAbsoluteCentralMoment / Math.Pow(1e9, 1.5), 1e-7);

    [Fact]
    public void Tilted_laws_follow_the_cumulant()
    {
        LawContract.TiltsConsistently(Law.Gamma(3, 2), 0.3, -5, 0);
        LawContract.TiltsConsistently(Law.Gamma(0.01, 1), 0.9, -1);
    }

    [Fact]
    public void No_expectation_exists_from_the_reciprocal_scale_on()
    {
        foreach (double tilt in new[] { 0.5, 0.6, 1e300 })
            Assert.Equal((double.PositiveInfinity, double.PositiveInfinity),
                (Law.Gamma(3, 2).LogMoment(tilt), Law.Gamma(3, 2).CentralLogMoment(tilt)));
        Assert.True(double.IsFinite(Law.Gamma(3, 2).LogMoment(0.4999999)));
        Assert.Equal((0, double.PositiveInfinity), (Law.Gamma(3, 2).Minimum, Law.Gamma(3, 2).Maximum));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double shape in new[] { double.NaN, 0, 9e-4, 1.01e9, double.PositiveInfinity })
            Assert.Throws<ArgumentOutOfRangeException>("shape", () => Law.Gamma(shape, 1));
        foreach (double scale in new[] { double.NaN, 0, -1, 1.01e90, double.PositiveInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("scale", () => Law.Gamma(1, scale));
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Law.Exponential(scale));
        }

        LawContract.RefusesTiltsWithoutALaw(Law.Gamma(3, 2), 0.5, 1, double.PositiveInfinity);
    }
}
