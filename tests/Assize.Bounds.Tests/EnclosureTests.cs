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

    [Fact]
    public void An_upper_end_is_rounded_up_and_never_nothing()
    {
        Assert.InRange(Enclosure.UpTo(0.25).Upper, 0.25 * (1 + 5e-13), 0.25 * (1 + 2e-12));
        Assert.Equal((0, 1), (Enclosure.UpTo(0.25).Lower, Enclosure.UpTo(3).Upper));
        Assert.Equal(1e-300, Enclosure.UpTo(0).Upper);
        Assert.InRange(Enclosure.UpToExponential(2).Upper, Math.Exp(-2) * (1 + 1e-12), Math.Exp(-2) * (1 + 1e-11));
        Assert.InRange(Enclosure.UpToExponential(690).Upper, Math.Exp(-690), Math.Exp(-690) * (1 + 1e-11));
        Assert.Equal((1, 1, 1e-300), (Enclosure.UpToExponential(0).Upper, Enclosure.UpToExponential(-5).Upper,
            Enclosure.UpToExponential(1e9).Upper));
    }
}
