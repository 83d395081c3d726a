namespace Assize.Bounds.Tests;

public class KolmogorovWalkTests
{
    // The documented accuracy.
    const double Accuracy = 1e-12;

    [Fact]
    public void It_agrees_with_four_hundred_bits()
    {
        int seen = 0;
        Assert.Empty(ReferenceTable.Misses("kolmogorov_exact", Accuracy, 55, row =>
        {
            var (trials, distance) = ((int)row.Whole("n"), row.Number("d"));
            if (distance > 0.5)
                return 0;

            seen++;
            double computed = KolmogorovWalk.Leaves(trials, trials * distance);
            double logarithm = row.Number("ln_complement");
            return logarithm < -690
                ? ReferenceTable.LogError(Math.Log(computed), logarithm)
                : ReferenceTable.RelativeError(computed, row.Number("complement"));
        }));
        Assert.True(seen > 30, $"only {seen} rows within one half");
    }

    // The table's own origin: K(10, 0.274) = 0.628479615…, G. Marsaglia, W. W. Tsang and J. Wang, J. Stat. Softw. 8
    // (2003), 18.
    [Fact]
    public void It_agrees_with_the_printed_value() =>
        Assert.Equal(0.6284796154565, 1 - KolmogorovWalk.Leaves(10, 2.74), 1e-12);

    // P(D < 1/(2n) + t): below 1/(2n) no path stays; n! · (2d - 1/n)^n for d up to 1/n (Birnbaum 1952).
    [Theory]
    [InlineData(3, 0.2)]
    [InlineData(5, 0.15)]
    [InlineData(8, 0.125)]
    public void Narrow_bands_have_a_formula(int trials, double distance)
    {
        double stays = 1;
        for (int i = 1; i <= trials; i++)
            stays *= i * (2 * distance - 1.0 / trials);

        Assert.Equal(1 - stays, KolmogorovWalk.Leaves(trials, trials * distance), 1e-14);
    }

    [Fact]
    public void A_wider_band_is_left_less_often()
    {
        double before = 1;
        for (double reach = 2; reach <= 10; reach += 0.05)
        {
            double leaves = KolmogorovWalk.Leaves(20, reach);
            Assert.True(leaves < before, $"{reach}");
            before = leaves;
        }
    }
}
