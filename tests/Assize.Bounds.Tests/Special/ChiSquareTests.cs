namespace Assize.Bounds.Tests;

public class ChiSquareTests
{
    // The documented accuracies.
    const double Accuracy = 5e-13;
    const double QuantileAccuracy = 2e-12;

    [Fact]
    public void Tails_agree_with_eighty_digits() => Assert.Empty(ReferenceTable.Misses(
        "chi2_tail", Accuracy, 213, row =>
    {
        var (degrees, point) = (row.Number("df"), row.Number("x"));
        return Math.Max(
            ReferenceTable.LogError(ChiSquare.LogUpperTail(degrees, point), row.Number("ln_sf")),
            ReferenceTable.LogError(ChiSquare.LogLowerTail(degrees, point), row.Number("ln_cdf")));
    }));

    [Fact]
    public void Tails_are_the_exponentials_of_their_logarithms() => Assert.Empty(ReferenceTable.Misses(
        "chi2_tail", 1e-12, 213, row =>
    {
        var (degrees, point) = (row.Number("df"), row.Number("x"));
        var (upper, lower) = (row.Number("ln_sf"), row.Number("ln_cdf"));
        return Math.Max(
            upper < -690 ? 0 : ReferenceTable.RelativeError(ChiSquare.UpperTail(degrees, point), Math.Exp(upper)),
            lower < -690 ? 0 : ReferenceTable.RelativeError(ChiSquare.LowerTail(degrees, point), Math.Exp(lower)));
    }));

    [Fact]
    public void Quantiles_lead_back_to_the_points_of_the_table() => Assert.Empty(ReferenceTable.Misses(
        "chi2_tail", 0, 213, row =>
    {
        var (degrees, point) = (row.Number("df"), row.Number("x"));
        var (upper, lower) = (Math.Exp(row.Number("ln_sf")), Math.Exp(row.Number("ln_cdf")));
        return Math.Max(
            upper is >= 1e-140 and <= 0.5 ? Excess(ChiSquare.UpperQuantile(degrees, upper), point) : 0,
            lower is >= 1e-140 and <= 0.5 ? Excess(ChiSquare.LowerQuantile(degrees, lower), point) : 0);
    }));

    static double Excess(double computed, double truth) =>
        Math.Max(0, ReferenceTable.RelativeError(computed, truth) - QuantileAccuracy);

    // NIST/SEMATECH e-Handbook of Statistical Methods, §1.3.6.7.4, critical values of the chi-square distribution.
    [Theory]
    [InlineData(1, 0.05, 3.841)]
    [InlineData(10, 0.01, 23.209)]
    [InlineData(100, 0.001, 149.449)]
    public void Quantiles_agree_with_the_handbook(double degrees, double probability, double point) =>
        Assert.Equal(point, ChiSquare.UpperQuantile(degrees, probability), 5e-4);

    // e^(-x/2) is the upper tail of two degrees of freedom.
    [Fact]
    public void Two_degrees_of_freedom_are_exponential()
    {
        for (double point = 1e-9; point < 1300; point *= 1.7)
        {
            Assert.True(ReferenceTable.LogError(ChiSquare.LogUpperTail(2, point), -point / 2) <= Accuracy, $"{point}");
            Assert.True(ReferenceTable.RelativeError(
                ChiSquare.LowerTail(2, point), -Elementary.ExpMinusOne(-point / 2)) <= Accuracy, $"{point}");
        }

        foreach (double probability in new[] { 1e-140, 1e-20, 0.01, 0.5 })
            Assert.Equal(1, ChiSquare.UpperQuantile(2, probability) / (-2 * Math.Log(probability)), QuantileAccuracy);
    }

    [Fact]
    public void Both_quantiles_meet_in_the_median()
    {
        foreach (double degrees in new[] { 1, 1.5, 2, 31, 1e4, 1e7, 2e9 })
            Assert.Equal(1, ChiSquare.UpperQuantile(degrees, 0.5) / ChiSquare.LowerQuantile(degrees, 0.5),
                2 * QuantileAccuracy);
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double degrees in new[] { double.NaN, 0, -1, 1.01e12, double.PositiveInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => ChiSquare.UpperTail(degrees, 1));
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => ChiSquare.LogLowerTail(degrees, 1));
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => ChiSquare.UpperQuantile(degrees, 0.1));
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => ChiSquare.LowerQuantile(degrees, 0.1));
        }

        foreach (double point in new[] { double.NaN, -double.Epsilon })
        {
            Assert.Throws<ArgumentOutOfRangeException>("point", () => ChiSquare.LowerTail(1, point));
            Assert.Throws<ArgumentOutOfRangeException>("point", () => ChiSquare.LogUpperTail(1, point));
        }

        foreach (double probability in new[] { double.NaN, 0, 0.51, 1e-141 })
        {
            Assert.Throws<ArgumentOutOfRangeException>("probability", () => ChiSquare.UpperQuantile(1, probability));
            Assert.Throws<ArgumentOutOfRangeException>("probability", () => ChiSquare.LowerQuantile(1, probability));
        }
    }
}
