namespace Assize.Bounds.Tests;

public class SlopesTests
{
    const double Accuracy = 1e-13;

    [Theory]
    [InlineData(0, 1)]
    [InlineData(-3, 9)]
    [InlineData(1e6, 1000001)]
    [InlineData(-1e-50, 1e-50)]
    public void Moments_have_formulas(double lower, double upper)
    {
        double half = (upper - lower) / 2;
        var (uniform, triangular) = (Law.Uniform(lower, upper), Law.Triangular(lower, upper));

        Assert.Equal(1, uniform.Variance / (half * half / 3), Accuracy);
        Assert.Equal(1, uniform.ThirdAbsoluteCentralMoment / (half * half * half / 4), Accuracy);
        Assert.Equal(1, triangular.Variance / (half * half / 6), Accuracy);
        Assert.Equal(1, triangular.ThirdAbsoluteCentralMoment / (half * half * half / 10), Accuracy);
        foreach (var law in new[] { uniform, triangular })
        {
            Assert.Equal(lower + half, law.Mean, Accuracy * half + 1e-16 * Math.Abs(lower));
            Assert.Equal((lower, upper), (law.Minimum, law.Maximum));
        }
    }

    // ln(sinh(h)/h), h = tilt · half a width; the triangle is the sum of two uniform draws of half the width.
    [Fact]
    public void Cumulants_have_formulas()
    {
        int seen = 0;
        foreach (double tilt in new[] { 1e-6, 0.01, 0.3, 0.9, 1.1, 7, 50, 700, 1500, 1e5, -1e-6, -0.9, -7, -1500 })
        {
            Assert.Equal(1, Law.Uniform(-1, 1).CentralLogMoment(tilt) / Centred(tilt), 1e-12);
            Assert.Equal(1, Law.Triangular(-1, 1).CentralLogMoment(tilt) / (2 * Centred(tilt / 2)), 1e-12);
            Assert.Equal(1, Law.Uniform(2, 4).LogMoment(tilt) / (3 * tilt + Centred(tilt)), 1e-12);
            seen++;
        }

        Assert.Equal(14, seen);
    }

    // Near 0 by h²/6 - h⁴/180 + h⁶/2835 - …, beyond 1 by h + ln((1 - e^-2h)/(2h)).
    static double Centred(double h)
    {
        h = Math.Abs(h);
        double z = h * h;
        return h < 0.02
            ? z / 6 - z * z / 180 + z * z * z / 2835
            : h < 1 ? Math.Log(Math.Sinh(h) / h) : h + Math.Log((1 - Math.Exp(-2 * h)) / (2 * h));
    }

    // With h = tilt · half a width a uniform law's mean moves by coth h - 1/h and its variance is 1/h² - 1/sinh² h.
    [Fact]
    public void Tilted_uniform_moments_have_formulas()
    {
        foreach (double h in new[] { 0.7, -2, 9, 40, -300, 2000, 1e6, 1e50 })
        {
            var law = Law.Uniform(-1, 1).Tilted(h);
            Assert.Equal(1 / Math.Tanh(h) - 1 / h, law.Mean, 1e-14);
            Assert.Equal(1, law.Variance / (1 / (h * h) - Math.Pow(Math.Sinh(h), -2)), 1e-11);
            // Far out the draw is exponential from the end.
            if (Math.Abs(h) > 100)
                Assert.Equal(12 / Math.E - 2, law.ThirdAbsoluteCentralMoment * Math.Abs(h * h * h), 1e-12);
        }
    }

    [Fact]
    public void Moments_and_cumulants_agree_with_sums_over_the_density()
    {
        foreach (double tilt in new[] { 0, 1.5, -6 })
        {
            // Middles of 200,000 stretches.
            var grid = LawContract.Grid(2.5e-6 - 0.5, 0.5, 5e-6, x => x, x => Math.Log(1 - Math.Abs(2 * x)) + tilt * x);
            LawContract.AgreesWithSums(Law.Triangular(-0.5, 0.5).Tilted(tilt), grid, 2e-9, 0.1, -3, 8);
        }
    }

    [Fact]
    public void Tilted_laws_follow_the_cumulant()
    {
        LawContract.TiltsConsistently(Law.Uniform(-1, 3), 0.1, 2, -40, 1e4);
        LawContract.TiltsConsistently(Law.Triangular(5, 6), 0.1, 20, -400, 0);
    }

    [Fact]
    public void A_tilted_cumulant_keeps_its_digits_beside_a_far_tilt()
    {
        // Exponential of rate 1e6 from the end: -ln(1 + s) + s for s = tilt/1e6, to the sliver's own accuracy.
        var law = Law.Uniform(0, 1).Tilted(1e6);
        foreach (double share in new[] { 1e-4, -1e-4, 0.3, -0.3 })
            Assert.Equal(1, law.CentralLogMoment(share * 1e6) / (share - Math.Log(1 + share)),
                1e-11 + 2e-15 / (share * share));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (var (lower, upper) in new[]
        {
            (0.0, 0.0), (1, 0), (double.NaN, 1), (0, double.NaN), (double.NegativeInfinity, 0),
                (0, double.PositiveInfinity), (-1.01e90, 0),
        })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => Law.Uniform(lower, upper));
            Assert.Throws<ArgumentOutOfRangeException>(() => Law.Triangular(lower, upper));
        }

        LawContract.RefusesTiltsWithoutALaw(Law.Uniform(0, 1), double.PositiveInfinity, 1e101);
        LawContract.RefusesTiltsWithoutALaw(Law.Triangular(0, 1), double.NegativeInfinity);
    }
}
