namespace Assize.Bounds.Tests;

public class RootBracketTests
{
    [Theory]
    [InlineData(2, 1, 2, 1.4142135623730951)]
    [InlineData(1e-12, 0, 1, 1e-6)]
    public void Square_roots_are_found(double square, double lower, double upper, double root)
    {
        var found = RootBracket.Find(x => x * x - square, lower, upper, 1e-15);

        Assert.True(found.Lower <= root && root <= found.Upper, $"{found}");
        Assert.True(found.Upper - found.Lower <= 1e-15 * found.Upper, $"{found}");
    }

    [Fact]
    public void Falling_steep_and_infinite_functions_are_closed_in_on()
    {
        Assert.Equal(0.7, RootBracket.Find(x => 0.7 - x, 0, 1, 1e-14).Upper, 1e-13);
        Assert.Equal(0.7, RootBracket.Find(x => Math.Pow(x, 301) - Math.Pow(0.7, 301), 0, 10, 1e-14).Upper, 1e-13);
        Assert.Equal(0.7, RootBracket.Find(x => Math.Log(x / 0.7), 0, 10, 1e-14).Upper, 1e-13);
        Assert.Equal(0.7, RootBracket.Find(x => x < 0.7 ? -1 : 1, 0, 1, 1e-14).Upper, 1e-13);
    }

    [Theory]
    [InlineData(0.7, 1)]
    [InlineData(1, 1)]
    [InlineData(1e-200, 5)]
    public void The_point_where_a_falling_function_stops_being_positive_is_rounded_up(double root, double greatest)
    {
        double found = RootBracket.Descent(x => Math.Log(root / x), greatest, 1e-14);

        Assert.InRange(found / root, 1, 1 + 1e-13);
    }

    [Fact]
    public void A_function_that_is_never_positive_stops_at_once_above_nothing() =>
        Assert.InRange(RootBracket.Descent(_ => -1, 1, 1e-14), 0, 1e-300);

    [Fact]
    public void A_root_at_an_end_is_kept()
    {
        Assert.Equal((1, 1), RootBracket.Find(x => x - 1, 1, 2, 1e-15));
        Assert.Equal(2, RootBracket.Find(x => x - 2, 1, 2, 1e-15).Upper);
    }

    [Fact]
    public void No_change_of_sign_is_an_error() =>
        Assert.Throws<InvalidOperationException>(() => RootBracket.Find(x => x * x + 1, 0, 1, 1e-10));

    [Fact]
    public void A_bracket_that_cannot_close_is_an_error_and_never_an_answer() =>
        Assert.Contains("did not close", Assert.Throws<InvalidOperationException>(
            () => RootBracket.Find(x => x <= 0 ? -1 : 1, -1, 1, 2e-16)).Message, StringComparison.Ordinal);

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => RootBracket.Find(x => x, 1, 0, 1e-10));
        Assert.Throws<ArgumentOutOfRangeException>(() => RootBracket.Find(x => x, double.NaN, 1, 1e-10));
        Assert.Throws<ArgumentOutOfRangeException>(() => RootBracket.Find(x => x, -1, 1, 0));
    }
}
