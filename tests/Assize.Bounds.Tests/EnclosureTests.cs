namespace Assize.Bounds.Tests;

public class EnclosureTests
{
    [Fact]
    public void Ends_are_kept_and_compared_by_value()
    {
        Assert.Equal((0, 1), (new Enclosure(0, 1).Lower, new Enclosure(0, 1).Upper));
        Assert.Equal(new Enclosure(0.2, 0.2), new Enclosure(0.2, 0.2));
    }

    [Theory]
    [InlineData(0.3, 0.2)]
    [InlineData(-0.1, 0.2)]
    [InlineData(0.1, 1.1)]
    [InlineData(double.NaN, 0.2)]
    [InlineData(0.1, double.NaN)]
    public void Ends_out_of_order_or_outside_are_refused(double lower, double upper) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new Enclosure(lower, upper));
}
