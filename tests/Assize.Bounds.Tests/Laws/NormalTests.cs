namespace Assize.Bounds.Tests;

public class NormalTests
{
    [Theory]
    [InlineData(0, 1)]
    [InlineData(-3, 0.2)]
    [InlineData(10, 4)]
    public void Moments_and_cumulants_agree_with_sums_over_the_density(double mean, double deviation) =>
        LawContract.AgreesWithSums(
        Law.Normal(mean, deviation),
        LawContract.Grid(-20, 20, 1e-3, z => mean + z * deviation, z => -z * z / 2),
        1e-12, 0.1 / deviation, -2 / deviation, 5 / deviation);

    [Fact]
    public void Tilted_laws_follow_the_cumulant() => LawContract.TiltsConsistently(Law.Normal(2, 3), 0.5, -4, 0);

    [Fact]
    public void The_support_is_the_whole_line() =>
        Assert.Equal((double.NegativeInfinity, double.PositiveInfinity),
            (Law.Normal(0, 1).Minimum, Law.Normal(0, 1).Maximum));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double mean in new[] { double.NaN, double.PositiveInfinity, -1.01e100 })
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Law.Normal(mean, 1));
        foreach (double deviation in new[] { double.NaN, 0, -1, 1.01e100, double.PositiveInfinity })
            Assert.Throws<ArgumentOutOfRangeException>("standardDeviation", () => Law.Normal(0, deviation));
        LawContract.RefusesTiltsWithoutALaw(Law.Normal(0, 1), double.PositiveInfinity, double.NegativeInfinity);
    }
}
