namespace Assize.Bounds.Tests;

public class DecimalsTests
{
    [Theory]
    [InlineData(0.999, 0.001)]
    [InlineData(0.9999, 0.0001)]
    [InlineData(0.999999999, 1e-9)]
    [InlineData(0.1, 0.9)]
    public void The_complement_is_the_decimal_one(double value, double complement) =>
        Assert.Equal(complement, Decimals.Complement(value));

    [Fact]
    public void The_complement_of_a_tiny_value_stays_below_one()
    {
        Assert.InRange(Decimals.Complement(1e-300), 0.9999, Math.BitDecrement(1.0));
        Assert.InRange(Decimals.Complement(2e-10), 0.9999, Math.BitDecrement(1.0));
    }

    [Fact]
    public void Four_digit_decimals_add_as_people_add_them()
    {
        int seen = 0;
        for (int a = 1; a < 10_000; a += 37)
        {
            for (int b = 1; b < 10_000; b += 41)
            {
                Assert.Equal(
                    (a + b) / 10_000.0,
                    Decimals.Nearest(Decimals.Exact(a / 10_000.0)!.Value + Decimals.Exact(b / 10_000.0)!.Value));
                seen++;
            }
        }

        Assert.Equal(271 * 244, seen);
    }

    [Theory]
    [InlineData(1e-11)]
    [InlineData(1e12)]
    [InlineData(5e-324)]
    public void Where_a_decimal_would_lose_digits_there_is_none(double value) => Assert.Null(Decimals.Exact(value));
}
