using System.Globalization;
using Assize.Testing;
using MathNet.Numerics;

namespace Assize.Bounds.Tests;

public class MillsRatioTests
{
    // MathNet.Numerics 5.0.0 was measured at 2.3e-13, dividing by √2 costs point² · 1.1e-16.
    const double Reference = 1e-12;

    [Fact]
    public void Every_enclosure_holds_the_complementary_error_function()
    {
        int seen = 0;
        for (int i = 1; i <= 3_700; i++)
        {
            double point = i / 100.0;
            double truth = SpecialFunctions.Erfc(point / Math.Sqrt(2)) / 2;
            foreach (var tail in new[]
                {
                    MillsRatio.Tail(point), MillsRatio.Tail(point, 1), MillsRatio.Tail(point, 2 + i % 40),
                })
            {
                Assert.True(tail.Lower <= truth * (1 + Reference), $"{point}: {truth:R} is below {tail}");
                Assert.True(tail.Upper >= truth * (1 - Reference), $"{point}: {truth:R} is above {tail}");
                seen++;
            }
        }

        Assert.Equal(11_100, seen);
    }

    // Common practice: φ(u)/u above and (1/u - 1/u³)φ(u) below the normal tail.
    [Fact]
    public void The_ends_are_the_two_expressions_in_use()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("normal_tail").Where(row => row.Number("z") is >= 1 and <= 37))
        {
            double point = row.Number("z");
            var tail = MillsRatio.Tail(point);
            double density = Math.Exp(-point * point / 2) / Math.Sqrt(2 * Math.PI);
            Assert.InRange(tail.Upper / Math.Min(0.5, density / point), 1, 1 + 4e-12);
            double below = density * (1 / point - 1 / (point * point * point));
            Assert.InRange(tail.Lower, below * (1 - 4e-12) - 1e-16, row.Number("phibar"));
            Assert.InRange(row.Number("phibar"), tail.Lower, tail.Upper);
            seen++;
        }

        Assert.True(seen > 90, $"only {seen} points");
    }

    [Fact]
    public void More_levels_narrow_the_enclosure_and_keep_its_sides()
    {
        foreach (double point in new[] { 0.5, 2, 6, 20 })
        {
            double before = 1;
            for (int levels = 1; levels <= 200; levels++)
            {
                var tail = MillsRatio.Tail(point, levels);
                double width = tail.Upper - tail.Lower;
                Assert.True(width <= before * (1 + 1e-3), $"{point} {levels}");
                before = width;
            }
        }
    }

    [Fact]
    public void Its_page_states_how_narrow_it_is()
    {
        var text = new System.Text.StringBuilder(
            "| point | tail | simplest below | simplest above | 10 levels apart | 40 levels apart |\n| --: | --: | --: | --: | --: | --: |\n");
        foreach (double point in new[] { 1.0, 2, 3, 4, 6, 10, 20, 37 })
        {
            double tail = NormalTail.Upper(point);
            var simple = MillsRatio.Tail(point);
            text.Append(CultureInfo.InvariantCulture,
                $"| {point} | {tail:0.000e+0} | {1 - simple.Lower / tail:0.0e+0} | {simple.Upper / tail - 1:0.0e+0} | {Apart(point, 10):0.0e+0} | {Apart(point, 40):0.0e+0} |\n");
            Assert.True(point < 3 || Apart(point, 40) < 5e-12, $"{point}: {Apart(point, 40)}");
        }

        Repository.MustContain("src/docs/tails/MillsRatio.md", "measured", text.ToString());
    }

    static double Apart(double point, int levels)
    {
        var tail = MillsRatio.Tail(point, levels);
        return tail.Upper / tail.Lower - 1;
    }

    [Fact]
    public void Points_at_the_rims_are_safe()
    {
        Assert.Equal((0, true), (MillsRatio.Tail(double.Epsilon).Lower, MillsRatio.Tail(double.Epsilon).Upper >= 0.5));
        Assert.InRange(MillsRatio.Tail(double.Epsilon, 1000).Upper, 0.5, 0.5 + 1e-11);
        Assert.Equal(new Enclosure(0, 1e-300), MillsRatio.Tail(1e150));
        Assert.Equal(0, MillsRatio.Tail(38).Lower);
        Assert.InRange(MillsRatio.Tail(38).Upper, 1e-300, 1.1e-300);
        Assert.Equal(0, MillsRatio.Tail(1).Lower, 1e-11);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-1)]
    [InlineData(1.1e150)]
    [InlineData(double.NaN)]
    public void Arguments_outside_the_domain_are_refused(double point)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => MillsRatio.Tail(point));
        Assert.Throws<ArgumentOutOfRangeException>(() => MillsRatio.Tail(point, 3));
        Assert.Throws<ArgumentOutOfRangeException>(() => MillsRatio.Tail(1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => MillsRatio.Tail(1, 1001));
    }
}
