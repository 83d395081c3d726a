namespace Assize.Bounds.Tests;

public class ElementaryTests
{
    [Fact]
    public void Logarithms_and_exponentials_agree_with_the_system_to_two_units_in_the_last_place()
    {
        var random = new Random(20240501);
        for (int i = 0; i < 100_000; i++)
        {
            double exponent = (random.NextDouble() - 0.5) * 1400;
            double value = Math.Exp(exponent);
            AssertUlps(Math.Log(value), Elementary.Log(value));
            AssertUlps(value, Elementary.Exp(exponent));
            double near = 1 + (random.NextDouble() - 0.5) * Math.Exp(-30 * random.NextDouble());
            AssertUlps(Math.Log(near), Elementary.Log(near));
        }
    }

    // ln(1+x) and e^x - 1 by their alternating and positive series, summed in 28 digits.
    [Fact]
    public void Small_arguments_keep_their_digits()
    {
        int seen = 0;
        for (double x = 1e-12; x < 0.1; x *= 1.37)
        {
            foreach (double signed in new[] { x, -x })
            {
                decimal exact = (decimal)signed;
                AssertUlps(
                    (double)Series(exact, (term, n) => -term * exact * (n - 1) / n),
                    Elementary.LogOnePlus((double)exact));
                AssertUlps((double)Series(exact, (term, n) => term * exact / n), Elementary.ExpMinusOne((double)exact));
                seen++;
            }
        }

        Assert.True(seen > 100, $"only {seen} arguments");
    }

    [Theory]
    [InlineData(1e-300)]
    [InlineData(-1e-20)]
    [InlineData(4e-324)]
    public void Tiny_arguments_are_their_own_answer(double value)
    {
        Assert.Equal(value, Elementary.LogOnePlus(value));
        Assert.Equal(value, Elementary.ExpMinusOne(value));
    }

    [Fact]
    public void One_undoes_the_other_on_both_sides_of_every_crossing()
    {
        foreach (double value in new[] { -0.999, -0.51, -0.49, -0.29, -0.2899, 0.4099, 0.41, 0.99, 1.01, 50, 1e10,
            1e16, 1e300 })
            Assert.True(
                ReferenceTable.RelativeError(Elementary.ExpMinusOne(Elementary.LogOnePlus(value)), value) < 1e-13,
                $"{value}");
    }

    [Fact]
    public void The_shortfall_is_the_difference_and_keeps_its_digits_near_zero()
    {
        foreach (double value in new[] { -0.9, -0.51, -0.5, -0.49, -0.3, 0.2, 0.25, 0.9, 0.99, 1, 1.01, 30 })
            Assert.Equal(value - Math.Log(1 + value), Elementary.LogShortfall(value), 1e-15 * (1 + Math.Abs(value)));
        foreach (double value in new[] { 1e-3, -1e-3, 1e-8, -1e-8, 1e-100 })
        {
            double series = value * value * (0.5 - value / 3 + value * value / 4 - value * value * value / 5);
            Assert.True(ReferenceTable.RelativeError(Elementary.LogShortfall(value), series) < 1e-12, $"{value}");
        }
    }

    // v²/2 + v³/6 + …, summed in 28 digits.
    [Fact]
    public void The_excess_over_the_tangent_keeps_its_digits()
    {
        int seen = 0;
        for (double x = 1e-4; x < 3; x *= 1.1)
        {
            foreach (double signed in new[] { x, -x })
            {
                decimal exact = (decimal)signed;
                decimal series = Series(exact * exact / 2, (term, n) => term * exact / (n + 1));
                double value = (double)exact;
                Assert.True(ReferenceTable.RelativeError(Elementary.ExpExcess(value), (double)series) < 2e-15,
                    $"{value:R}");
                seen++;
            }
        }

        Assert.True(seen > 200, $"only {seen} arguments");
        Assert.Equal(0.5, Elementary.ExpExcess(1e-100) / 1e-200, 1e-15);
        Assert.Equal(Elementary.ExpExcess(Math.BitDecrement(0.7)), Elementary.ExpExcess(0.7), 1e-15);
        Assert.Equal(
            (0, 999, double.PositiveInfinity),
            (Elementary.ExpExcess(0), Elementary.ExpExcess(-1000), Elementary.ExpExcess(double.PositiveInfinity)));
        Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.ExpExcess(double.NaN));
    }

    [Fact]
    public void Ends_of_the_domain_are_exact()
    {
        Assert.Equal(double.NegativeInfinity, Elementary.Log(0));
        Assert.Equal(double.PositiveInfinity, Elementary.Log(double.PositiveInfinity));
        Assert.Equal(0, Elementary.Log(1));
        Assert.Equal(double.NegativeInfinity, Elementary.LogOnePlus(-1));
        Assert.Equal(1, Elementary.Exp(0));
        Assert.Equal(0, Elementary.Exp(double.NegativeInfinity));
        Assert.Equal(double.PositiveInfinity, Elementary.Exp(709.8));
        Assert.Equal(double.Epsilon, Elementary.Exp(-744.5));
        Assert.Equal(0, Elementary.Exp(-746));
        Assert.Equal(-1, Elementary.ExpMinusOne(double.NegativeInfinity));
        Assert.Equal(0, Elementary.ExpMinusOne(0));
        AssertUlps(Math.Log(double.Epsilon), Elementary.Log(double.Epsilon));
        AssertUlps(Math.Log(double.MaxValue), Elementary.Log(double.MaxValue));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double value in new[] { double.NaN, -double.Epsilon })
            Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.Log(value));
        foreach (double value in new[] { double.NaN, -1.0000000000000002 })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.LogOnePlus(value));
            Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.LogShortfall(value));
        }

        Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.Exp(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => Elementary.ExpMinusOne(double.NaN));
    }

    static decimal Series(decimal first, Func<decimal, int, decimal> next)
    {
        decimal sum = 0;
        int n = 1;
        for (decimal term = first; term != 0 && n < 60; term = next(term, n))
        {
            sum += term;
            n++;
        }

        return sum;
    }

    static void AssertUlps(double expected, double actual) =>
        Assert.True(expected == actual
            || Math.Abs(BitConverter.DoubleToInt64Bits(expected) - BitConverter.DoubleToInt64Bits(actual)) <= 2,
            $"{actual:R} against {expected:R}");
}
