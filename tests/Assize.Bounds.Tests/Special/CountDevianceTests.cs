namespace Assize.Bounds.Tests;

public class CountDevianceTests
{
    // Digits are doubled by decimals where count and mean are near, and by the plain formula where they are far.
    [Theory]
    [InlineData(10, 1)]
    [InlineData(10, 4.999)]
    [InlineData(10, 5.001)]
    [InlineData(3, 200)]
    [InlineData(1, 1e-200)]
    public void Far_from_the_mean_it_is_the_plain_formula(double count, double mean) => Assert.Equal(
        1, CountDeviance.Of(count, mean - count, mean) / (count * Math.Log(count / mean) + mean - count), 2e-15);

    // With r = excess/count, count · (r - ln(1 + r)) = count · (r²/2 - r³/3 + …).
    [Theory]
    [InlineData(1e9, 1)]
    [InlineData(1e9, -40)]
    [InlineData(7, 1e-9)]
    public void Near_the_mean_it_keeps_its_digits(double count, double excess)
    {
        double r = excess / count;
        Assert.Equal(1, CountDeviance.Of(count, excess, count + excess) / (count * r * r * (0.5 - r / 3 + r * r / 4)),
            1e-15);
    }

    [Fact]
    public void Nothing_counted_or_nothing_expected_has_its_limit()
    {
        Assert.Equal(4, CountDeviance.Of(0, 4, 4));
        Assert.Equal(double.PositiveInfinity, CountDeviance.Of(4, -4, 0));
        Assert.Equal((0, 0), (CountDeviance.Of(0, 0, 0), CountDeviance.Of(5, 0, 5)));
    }
}
