namespace Assize.Bounds.Tests;

public class GaussLegendreTests
{
    [Theory]
    [InlineData(2)]
    [InlineData(5)]
    [InlineData(16)]
    [InlineData(40)]
    public void Powers_up_to_twice_the_points_less_one_are_exact(int count)
    {
        var rule = new GaussLegendre(count);
        for (int power = 0; power < 2 * count; power++)
        {
            double truth = (Math.Pow(1.5, power + 1) - Math.Pow(-0.5, power + 1)) / (power + 1);
            Assert.Equal(1, rule.Integrate(x => Math.Pow(x, power), -0.5, 1.5) / truth, 3e-14);
        }
    }

    // M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964), table 25.4, n = 2: points ±1/√3,
    // weights 1.
    [Fact]
    public void Two_points_are_the_handbooks() => Assert.Equal(
        2 * Math.Exp(0.2) * Math.Cosh(1 / Math.Sqrt(3)), new GaussLegendre(2).Integrate(x => Math.Exp(x + 0.2), -1, 1),
            1e-15);

    [Fact]
    public void One_power_more_is_not_exact() =>
        Assert.NotEqual(2.0 / 5, new GaussLegendre(2).Integrate(x => x * x * x * x, -1, 1), 1e-3);
}
