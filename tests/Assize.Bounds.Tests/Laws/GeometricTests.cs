namespace Assize.Bounds.Tests;

public class GeometricTests
{
    static (double, double)[] Masses(double rate) =>
        [.. Enumerable.Range(1, (int)(1 + 60 / rate)).Select(k => ((double)k, Math.Exp((k - 1) * Math.Log(1 - rate))))];

    [Theory]
    [InlineData(0.999)]
    [InlineData(0.5)]
    [InlineData(0.3)]
    [InlineData(0.001)]
    public void Moments_and_cumulants_agree_with_sums_over_the_masses(double rate)
    {
        var law = Law.Geometric(rate);

        LawContract.AgreesWithSums(law, Masses(rate), 2e-12, 0.2 * rate, -rate, -0.1);
        LawContract.TurnsOnItsLattice(law, Masses(rate), 1, 1);
        Assert.Equal((1, double.PositiveInfinity), (law.Minimum, law.Maximum));
    }

    [Fact]
    public void Rare_successes_are_nearly_exponential() => Assert.Equal(
        12 / Math.E - 2, Law.Geometric(1e-9).ThirdAbsoluteCentralMoment * 1e-27, 1e-8);

    [Fact]
    public void Tilted_laws_follow_the_cumulant()
    {
        LawContract.TiltsConsistently(Law.Geometric(0.3), 0.2, -3, 0);
        LawContract.TiltsConsistently(Law.Geometric(1e-4), 5e-5, -1e-3);
    }

    [Fact]
    public void No_expectation_exists_once_the_failures_outweigh_the_tilt()
    {
        Assert.Equal(double.PositiveInfinity, Law.Geometric(0.5).LogMoment(0.7));
        Assert.True(double.IsFinite(Law.Geometric(0.5).LogMoment(0.69)));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double rate in new[] { double.NaN, 0, 1, 9e-10, -1 })
            Assert.Throws<ArgumentOutOfRangeException>("rate", () => Law.Geometric(rate));
        LawContract.RefusesTiltsWithoutALaw(Law.Geometric(0.5), 0.7, 1000, double.PositiveInfinity);
    }
}
