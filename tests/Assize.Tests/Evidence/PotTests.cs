namespace Assize.Tests.Evidence;

public class PotTests
{
    [Fact]
    public void Wealth_is_the_weighted_sum_of_products()
    {
        var pot = new Pot([0.5, 0.25, 0.25], 1e9);
        double[] factors = new double[Pot.Padded(3)];
        decimal[] products = [0.5m, 0.25m, 0.25m];
        var rng = new Random(5);
        for (int trial = 0; trial < 100; trial++)
        {
            for (int i = 0; i < 3; i++)
            {
                factors[i] = (rng.Next(15) + 1) / 8.0;
                products[i] *= (decimal)factors[i];
            }

            Assert.False(pot.Play(factors));
            Assert.Equal(Math.Log((double)products.Sum()), pot.LogAtLeast, 1e-9);
            Assert.True(pot.LogAtLeast <= Math.Log((double)products.Sum()) + 1e-15);
        }
    }

    // 2^n reaches e^level at n = level / ln 2, however far beyond a double's range that is.
    [Theory]
    [InlineData(20)]
    [InlineData(2_000)]
    [InlineData(60_000)]
    public void The_level_is_reached_at_the_first_trial_that_surely_has(double level)
    {
        var pot = new Pot([1], level);
        double[] factors = [2, 0, 0, 0];
        long trial = 1;
        while (!pot.Play(factors))
            trial++;

        Assert.Equal((long)Math.Ceiling(level / Math.Log(2)), trial);
    }

    [Fact]
    public void Huge_factors_neither_overflow_nor_lose_wealth()
    {
        var pot = new Pot([0.5, 0.5], 5_000);
        double[] factors = [1e150, 1e-150, 0, 0];
        for (int trial = 1; trial <= 14; trial++)
            Assert.False(pot.Play(factors));
        Assert.True(pot.Play(factors));
        Assert.Equal(15 * 150 * Math.Log(10) - Math.Log(2), pot.LogAtLeast, 1e-6);
    }

    [Fact]
    public void A_pot_without_bets_has_no_wealth() => Assert.False(new Pot([], 1).Play([]));
}
