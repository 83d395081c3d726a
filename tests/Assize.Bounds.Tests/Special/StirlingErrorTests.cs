using MathNet.Numerics;

namespace Assize.Bounds.Tests;

public class StirlingErrorTests
{
    [Fact]
    public void It_is_what_the_formula_leaves_out()
    {
        for (int n = 1; n <= 400; n++)
        {
            double factorial = SpecialFunctions.GammaLn(n + 1);
            double stirling = 0.5 * Math.Log(2 * Math.PI * n) + n * Math.Log(n) - n;
            // The subtraction loses digits of the larger terms.
            Assert.Equal(factorial - stirling, StirlingError.Of(n), 4e-14 * Math.Max(1, n));
        }
    }

    // One entry of the table from whole numbers: 15! = 1307674368000.
    [Fact]
    public void An_entry_of_the_table_is_recomputed() => Assert.Equal(
        Math.Log(1307674368000) - 0.5 * Math.Log(30 * Math.PI) - 15 * Math.Log(15) + 15, StirlingError.Of(15), 2e-14);

    [Fact]
    public void Table_and_series_meet() => Assert.Equal(
        StirlingError.Of(15) - StirlingError.Of(16),
        -Math.Log(16) - 0.5 * Math.Log(15.0 / 16) - 15 * Math.Log(15) + 16 * Math.Log(16) - 1, 2e-14);

    // C(n, k) (k/n)^k (1 - k/n)^(n - k) is the mass at the mean: 6/16 for 2 of 4, 252/1024 for 5 of 10.
    [Fact]
    public void The_binomial_part_is_the_mass_at_the_mean()
    {
        Assert.Equal(Math.Log(6.0 / 16), StirlingError.OfBinomial(4, 2), 1e-15);
        Assert.Equal(Math.Log(252.0 / 1024), StirlingError.OfBinomial(10, 5), 1e-15);
        Assert.Equal((0, 0), (StirlingError.OfBinomial(7, 0), StirlingError.OfBinomial(7, 7)));
    }

    [Fact]
    public void A_large_count_leaves_a_twelfth_of_its_inverse() => Assert.Equal(1 / 12e9, StirlingError.Of(1e9), 1e-25);
}
