namespace Assize.Bounds.Tests;

public class EdgesTests
{
    [Fact]
    public void Plus_or_minus_gives_four_numbers()
    {
        var edges = Edges.Around(Domain.Rate, 0.5, tolerance: 0.05, defect: 0.1);

        Assert.Equal(
            (0.4, 0.45, 0.5, 0.55, 0.6),
            (edges.LowerDefect, edges.LowerEdge, edges.Target, edges.UpperEdge, edges.UpperDefect));
    }

    [Fact]
    public void The_defect_is_twice_the_tolerance_unless_given() =>
        Assert.Equal(Edges.Around(Domain.Rate, 0.5, 0.01, 0.02), Edges.Around(Domain.Rate, 0.5, 0.01));

    [Fact]
    public void One_sided_claims_have_one_side()
    {
        var least = Edges.AtLeast(Domain.Rate, 0.9, 0.1);
        var most = Edges.AtMost(Domain.Rate, 0.01, 0.02);

        Assert.Equal((0.8, 0.9, null, null), (least.LowerDefect, least.LowerEdge, least.UpperEdge, least.UpperDefect));
        Assert.Equal((null, null, 0.01, 0.03), (most.LowerDefect, most.LowerEdge, most.UpperEdge, most.UpperDefect));
    }

    // In binary, 0.1 + 0.2 - 0.3 is 5.6e-17 and 0.3 - 0.1 - 0.2 is -2.8e-17: a side would be lost or gained.
    [Theory]
    [InlineData(0.3, 0.1, 0.3, 0.0, 0.2, 0.4, 0.6)]
    [InlineData(0.1, 0.05, 0.1, 0.0, 0.05, 0.15, 0.2)]
    [InlineData(0.7, 0.1, 0.3, 0.4, 0.6, 0.8, 1.0)]
    [InlineData(0.9, 0.05, 0.1, 0.8, 0.85, 0.95, 1.0)]
    [InlineData(0.57, 0.01, 0.43, 0.14, 0.56, 0.58, 1.0)]
    public void A_defect_on_the_rim_in_decimal_is_a_side(
        double target, double tolerance, double defect, double lowerDefect, double lower, double upper, double upperDefect)
    {
        var edges = Edges.Around(Domain.Rate, target, tolerance, defect);

        Assert.Equal(
            (lowerDefect, lower, upper, upperDefect),
            (edges.LowerDefect, edges.LowerEdge, edges.UpperEdge, edges.UpperDefect));
    }

    [Fact]
    public void Every_two_digit_rim_is_hit_exactly()
    {
        int seen = 0;
        for (int hundredths = 1; hundredths < 100; hundredths++)
        {
            double target = hundredths / 100.0;
            Assert.Equal(0, Edges.AtLeast(Domain.Rate, target, target).LowerDefect);
            Assert.Equal(1, Edges.AtMost(Domain.Rate, target, (100 - hundredths) / 100.0).UpperDefect);
            seen++;
        }

        Assert.Equal(99, seen);
    }

    [Fact]
    public void A_defect_outside_the_domain_is_no_side_but_its_edge_stays()
    {
        var edges = Edges.Around(Domain.Rate, 0.001, 0, 0.2);

        Assert.Equal(
            (null, 0.001, 0.001, 0.201), (edges.LowerDefect, edges.LowerEdge, edges.UpperEdge, edges.UpperDefect));
    }

    [Theory]
    [InlineData(0.02, 0.02)]
    [InlineData(0.02, 0.03)]
    public void An_edge_on_or_beyond_the_rim_is_no_side(double target, double tolerance)
    {
        var edges = Edges.Around(Domain.Rate, target, tolerance);

        Assert.Null(edges.LowerEdge);
        Assert.Null(edges.LowerDefect);
    }

    [Fact]
    public void Edges_keep_their_order_for_random_decimals()
    {
        var random = new Random(7);
        int seen = 0;
        while (seen < 20_000)
        {
            double target = Math.Round(random.NextDouble(), random.Next(1, 12));
            double tolerance = Math.Round(random.NextDouble() * Math.Pow(10, -random.Next(0, 6)), 9);
            double defect = tolerance + Math.Round(random.NextDouble() * Math.Pow(10, -random.Next(0, 6)), 9) + 1e-9;
            if (target - defect < 0 && target + defect > 1)
                continue;

            var edges = Edges.Around(Domain.Rate, target, tolerance, defect);
            double?[] all = [edges.LowerDefect, edges.LowerEdge, edges.Target, edges.UpperEdge, edges.UpperDefect];
            double[] order = [.. all.OfType<double>()];
            Assert.Equal(order.Order(), order);
            Assert.True(
                edges.LowerDefect is null || edges.LowerDefect < edges.LowerEdge, $"{target} {tolerance} {defect}");
            Assert.True(
                edges.UpperDefect is null || edges.UpperDefect > edges.UpperEdge, $"{target} {tolerance} {defect}");
            Assert.All(order, edge => Assert.InRange(edge, 0, 1));
            seen++;
        }
    }

    [Theory]
    [InlineData(1.5, 0.1, 0.2, "target", "1.5")]
    [InlineData(-0.1, 0.1, 0.2, "target", "-0.1")]
    [InlineData(double.NaN, 0.1, 0.2, "target", "NaN")]
    [InlineData(double.PositiveInfinity, 0.1, 0.2, "target", "Infinity")]
    [InlineData(0.5, -0.1, 0.2, "tolerance", "-0.1")]
    [InlineData(0.5, double.NaN, 0.2, "tolerance", "NaN")]
    [InlineData(0.5, double.PositiveInfinity, 0.2, "tolerance", "Infinity")]
    [InlineData(0.5, 0.1, 0.0, "defect", "0")]
    [InlineData(0.5, 0.1, -0.2, "defect", "-0.2")]
    [InlineData(0.5, 0.1, double.NaN, "defect", "NaN")]
    [InlineData(0.5, 0.1, double.PositiveInfinity, "defect", "Infinity")]
    [InlineData(0.5, 0.1, 0.1, "greater distance than the tolerance", "0.1")]
    [InlineData(0.5, 0.2, 0.1, "greater distance than the tolerance", "0.2")]
    [InlineData(0.5, 0.1, 0.6, "nothing to catch", "-0.1")]
    [InlineData(0.5, 0.1, 1e300, "nothing to catch", "1E+300")]
    [InlineData(0.5, 0, 1e-17, "cannot be told", "1E-17")]
    [InlineData(0.5, 0.1, 0.10000000000000002, "cannot be told", "0.10000000000000002")]
    [InlineData(0.5, 0, 5e-324, "cannot be told", "5E-324")]
    public void Nonsense_is_refused_by_name_and_value(
        double target, double tolerance, double defect, string name, string value)
    {
        string message = Assert.Throws<ClaimRefusedException>(() => Edges.Around(Domain.Rate, target, tolerance, defect)).Message;

        Assert.Contains(name, message, StringComparison.OrdinalIgnoreCase);
        Assert.Contains(value, message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_tolerance_of_zero_needs_a_defect()
    {
        var refused = Assert.Throws<ClaimRefusedException>(() => Edges.Around(Domain.Rate, 0.5, 0));

        Assert.Contains("explicit defect", refused.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.3, 0.4)]
    [InlineData(0.3, 0)]
    [InlineData(0.3, -1)]
    [InlineData(0.3, double.NaN)]
    [InlineData(0.3, double.PositiveInfinity)]
    [InlineData(0.3, 1e-18)]
    [InlineData(0, 0.1)]
    [InlineData(double.NaN, 0.1)]
    [InlineData(1.0000001, 0.1)]
    public void One_sided_nonsense_is_refused(double target, double defect)
    {
        Assert.Throws<ClaimRefusedException>(() => Edges.AtLeast(Domain.Rate, target, defect));
        Assert.Throws<ClaimRefusedException>(() => Edges.AtMost(Domain.Rate, 1 - target, defect));
    }

    [Fact]
    public void Any_domain_takes_huge_and_subnormal_numbers()
    {
        var huge = Edges.Around(Domain.Any, 1e300, 1e298, 1e299);
        var tiny = Edges.Around(Domain.Any, 0, 5e-324, 1e-323);

        Assert.Equal((9e299, 1.1e300), (huge.LowerDefect, huge.UpperDefect));
        Assert.Equal(
            (-1e-323, -5e-324, 5e-324, 1e-323), (tiny.LowerDefect, tiny.LowerEdge, tiny.UpperEdge, tiny.UpperDefect));
    }

    [Fact]
    public void A_side_beyond_the_greatest_double_is_no_side()
    {
        var edges = Edges.Around(Domain.Any, 1.7e308, 1e307, 1e308);

        Assert.Equal((1.7e308 - 1e308, null), (edges.LowerDefect, edges.UpperDefect));
        Assert.Throws<ClaimRefusedException>(() => Edges.AtMost(Domain.Any, 1.7e308, 1e308));
    }

    [Fact]
    public void A_small_rate_keeps_its_digits()
    {
        var edges = Edges.AtMost(Domain.Rate, 1e-9, 1e-9);
        var tiny = Edges.AtMost(Domain.Rate, 3e-30, 4e-30);

        Assert.Equal(2e-9, edges.UpperDefect);
        Assert.Equal(7e-30, tiny.UpperDefect!.Value, 1e-45);
    }

    [Fact]
    public void Four_numbers_need_not_be_symmetric()
    {
        var edges = Edges.Between(Domain.Rate, 0.3, 0.1, 0.25, 0.4, 0.8);

        Assert.Equal(
            (0.1, 0.25, 0.3, 0.4, 0.8),
            (edges.LowerDefect, edges.LowerEdge, edges.Target, edges.UpperEdge, edges.UpperDefect));
    }

    [Fact]
    public void Four_numbers_drop_what_lies_outside_the_domain()
    {
        var edges = Edges.Between(Domain.Rate, 0.3, -0.1, 0, 0.4, 1);

        Assert.Equal((null, null, 0.4, 1.0), (edges.LowerDefect, edges.LowerEdge, edges.UpperEdge, edges.UpperDefect));
    }

    [Theory]
    [InlineData(0.1, 0.4, 0.5, 0.6)]
    [InlineData(0.1, 0.2, 0.25, 0.6)]
    [InlineData(0.2, 0.2, 0.4, 0.6)]
    [InlineData(0.1, 0.2, 0.4, 0.4)]
    [InlineData(0.1, 0.2, 0.4, double.NaN)]
    [InlineData(0.1, double.NaN, 0.4, 0.6)]
    [InlineData(-0.1, 0.2, 0.4, 1.6)]
    public void Four_numbers_out_of_order_are_refused(
        double lowerDefect, double lower, double upper, double upperDefect)
    {
        Assert.Throws<ClaimRefusedException>(
            () => Edges.Between(Domain.Rate, 0.3, lowerDefect, lower, upper, upperDefect));
        Assert.Throws<ClaimRefusedException>(() => Edges.Between(Domain.Rate, 0.3, 0.1, null, null, null));
        Assert.Throws<ClaimRefusedException>(() => Edges.Between(Domain.Rate, 0.3, null, 0.2, 0.4, null));
    }
}
