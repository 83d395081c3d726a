using MathNet.Numerics;

namespace Assize.Bounds.Tests;

public class NormalTailTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    [Fact]
    public void Tails_agree_with_eighty_digits()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("normal_tail"))
        {
            double z = row.Number("z");
            AssertClose(NormalTail.LogUpper(z), row.Number("ln_phibar"), row);
            // The logarithm of a number near 1 keeps few of its digits.
            Assert.Equal(Math.Log(row.Number("phi_cdf")), NormalTail.LogUpper(-z), 5e-16);
            if (row.Number("phibar") > 1e-300)
                AssertClose(NormalTail.Upper(z), row.Number("phibar"), row);

            AssertClose(NormalTail.Lower(z), row.Number("phi_cdf"), row);
            seen++;
        }

        Assert.Equal(168, seen);
    }

    [Fact]
    public void Quantiles_agree_with_eighty_digits()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("normal_quantile"))
        {
            AssertClose(NormalTail.UpperQuantile(row.Number("p")), row.Number("z_upper"), row);
            seen++;
        }

        Assert.Equal(245, seen);
    }

    // M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964), table 26.1 and, as -log10 Q(x),
    // table 26.2 (from memory).
    [Theory]
    [InlineData(1, 0.158655253931457)]
    [InlineData(2, 0.022750131948179)]
    [InlineData(3, 0.001349898031630)]
    public void Printed_table_is_reproduced(double point, double printed) =>
        Assert.Equal(printed, NormalTail.Upper(point), 0.5e-15);

    [Theory]
    [InlineData(5, 6.54265)]
    [InlineData(10, 23.11805)]
    [InlineData(50, 544.96634)]
    [InlineData(100, 2173.87154)]
    public void Printed_logarithms_are_reproduced(double point, double printed) =>
        Assert.Equal(printed, -NormalTail.LogUpper(point) / Math.Log(10), 0.5e-5);

    [Fact]
    public void An_independent_library_agrees()
    {
        for (int i = 0; i <= 370; i++)
        {
            double point = i / 10.0;
            double reference = SpecialFunctions.Erfc(point / Math.Sqrt(2)) / 2;
            // MathNet.Numerics 5.0.0 was measured at 2.3e-13; dividing by √2 costs point² · 1.1e-16.
            Assert.True(ReferenceTable.RelativeError(NormalTail.Upper(point), reference) < 1e-12, $"{point}");
        }
    }

    [Fact]
    public void Mills_ratio_is_the_tail_over_the_density_on_both_sides_of_the_crossing()
    {
        foreach (double point in new[] { 0, 0.5, 2.2499999, 2.25, 2.2500001, 6, 30 })
        {
            double density = Math.Exp(-point * point / 2) / Math.Sqrt(2 * Math.PI);
            AssertClose(NormalTail.Mills(point), NormalTail.Upper(point) / density, null, 1e-12);
        }
    }

    [Fact]
    public void Quantile_undoes_the_tail_on_both_sides_of_every_crossing()
    {
        foreach (double p in new[] { 1e-300, 1e-9, 0.1999999, 0.2, 0.2000001, 0.4999999999, 0.5, 0.5000000001, 0.9, 1 - 1e-12 })
            AssertClose(NormalTail.Upper(NormalTail.UpperQuantile(p)), p, null, 1e-12);
    }

    [Fact]
    public void Values_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => NormalTail.Upper(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => NormalTail.LogUpper(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => NormalTail.Mills(-1e-9));
        foreach (double p in new[] { 0, 1, -0.1, 1.1, double.NaN })
            Assert.Throws<ArgumentOutOfRangeException>(() => NormalTail.UpperQuantile(p));

        Assert.Equal((0, 1), (NormalTail.Upper(double.PositiveInfinity), NormalTail.Upper(double.NegativeInfinity)));
    }

    static void AssertClose(double computed, double truth, ReferenceTable.Row? row, double accuracy = Accuracy) => Assert.True(
        ReferenceTable.RelativeError(computed, truth) <= accuracy, $"{row}: {computed:R} against {truth:R}");
}
