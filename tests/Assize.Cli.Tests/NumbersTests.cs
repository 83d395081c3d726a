namespace Assize.Cli.Tests;

public class NumbersTests
{
    [Theory]
    [InlineData(1e-9, "1e-9")]
    [InlineData(17e-9, "1.7e-8")]
    [InlineData(9.466671008e-7, "9.47e-7")]
    [InlineData(0.0009095053, "9.1e-4")]
    [InlineData(0.12301, "0.124")]
    [InlineData(0.9991, "1")]
    [InlineData(0, "0")]
    [InlineData(1, "1")]
    public void A_probability_is_rounded_up(double probability, string text) => Assert.Equal(text, Numbers.AtMost(probability));
}
