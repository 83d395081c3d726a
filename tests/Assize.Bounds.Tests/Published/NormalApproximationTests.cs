namespace Assize.Bounds.Tests.Published;

/// <summary>Constants of the normal approximation: C.-G. Esseen (1956), I. Tyurin (2009), I. G. Shevtsova (2013), as listed
/// by public tables of the Berry–Esseen constant (seen), and facts in common use.</summary>
public class NormalApproximationTests
{
    // (√10 + 3) / (6√(2π)) = 0.4097321837: no constant can be smaller, and trials of rate (4 - √10)/2 come near it.
    [Fact]
    public void Esseens_constant_is_approached_from_below()
    {
        double constant = (Math.Sqrt(10) + 3) / (6 * Math.Sqrt(2 * Math.PI));
        double rate = (4 - Math.Sqrt(10)) / 2, ratio = (1 - 2 * rate * (1 - rate)) / Math.Sqrt(rate * (1 - rate));
        Assert.Equal(0.4097321837, constant, 5e-11);

        foreach (int trials in new[] { 10, 1_000, 10_000 })
        {
            double reached = Greatest(trials, rate) * Math.Sqrt(trials) / ratio;
            Assert.InRange(reached, 0.97 * constant, constant);
            Assert.InRange(BerryEsseen.Distance(Law.Bernoulli(rate), trials) * Math.Sqrt(trials) / ratio, reached, 0.4691);
        }
    }

    static double Greatest(int trials, double rate)
    {
        double greatest = 0, deviation = Math.Sqrt(trials * rate * (1 - rate));
        for (int successes = 0; successes <= trials; successes++)
        {
            double normal = NormalTail.Lower((successes - trials * rate) / deviation);
            greatest = Math.Max(greatest, Math.Max(
                Math.Abs(Binomial.LowerTail(trials, successes, rate) - normal),
                Math.Abs(Binomial.LowerTail(trials, successes - 1, rate) - normal)));
        }

        return greatest;
    }

    // 0.4690 for one law; 0.5606 for several, quoted as 0.56 in common practice (0.5600 is the best on record).
    [Fact]
    public void Constants_are_the_ones_on_record()
    {
        Assert.Equal(0.4690, BerryEsseen.Distance(Law.Bernoulli(0.5), 10_000) * 100, 1e-9);
        var strata = Draws.Of([(Law.Bernoulli(0.5), 5_000), (Law.Bernoulli(0.5).Image(-1, 0), 5_000)]);
        Assert.Equal(0.5606, BerryEsseen.Distance(strata) * 100, 1e-9);
    }

    // Common practice: n fair coins have Σ E|X|³ / B³ = 1/√n.
    [Theory]
    [InlineData(1)]
    [InlineData(100)]
    [InlineData(1_000_000_000)]
    public void Fair_coins_have_a_Lyapunov_ratio_of_one_over_the_root(long coins)
    {
        var draws = Draws.Of(Law.Bernoulli(0.5), coins);

        Assert.Equal(1, draws.ThirdAbsoluteCentralMoments / Math.Pow(draws.Variance, 1.5) * Math.Sqrt(coins), 1e-14);
    }

    // Common practice: for n coins worth ±1/√n, S ≤ u is heads ≤ n/2 + u√n/2.
    [Fact]
    public void A_standardised_sum_of_coins_counts_heads()
    {
        int seen = 0;
        foreach (int coins in new[] { 4, 25, 100, 1_024 })
        {
            var draws = Draws.Of(Law.Bernoulli(0.5).Image(2 / Math.Sqrt(coins), -1 / Math.Sqrt(coins)), coins);
            for (double u = -3; u <= 3; u += 0.37)
            {
                long heads = (long)Math.Floor(coins / 2.0 + u * Math.Sqrt(coins) / 2);
                var (sum, count) = (LatticeSum.LowerTail(draws, u), BinomialTail.LowerTail(coins, heads, 0.5));
                Assert.True(sum.Lower <= count.Upper && count.Lower <= sum.Upper, $"{coins} {u}: {sum} {count}");
                Assert.True(heads < 0 || sum.Upper <= count.Upper * (1 + 1e-9));
                seen++;
            }
        }

        Assert.Equal(68, seen);
    }

    // M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964), tables 26.1 and 26.5 (from memory).
    [Theory]
    [InlineData(0.5, 0.691462461274013)]
    [InlineData(1, 0.841344746068543)]
    [InlineData(1.5, 0.933192798731142)]
    [InlineData(2, 0.977249868051821)]
    public void Normal_probabilities(double point, double printed) =>
        Assert.Equal(printed, NormalTail.Lower(point), 0.6e-15);

    [Theory]
    [InlineData(0.1, 1.28155)]
    [InlineData(0.05, 1.64485)]
    [InlineData(0.025, 1.95996)]
    [InlineData(0.005, 2.57583)]
    [InlineData(0.001, 3.09023)]
    public void Normal_points(double probability, double printed) =>
        Assert.Equal(printed, NormalTail.UpperQuantile(probability), 0.5e-5);
}
