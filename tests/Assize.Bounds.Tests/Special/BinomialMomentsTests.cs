namespace Assize.Bounds.Tests;

public class BinomialMomentsTests
{
    [Fact]
    public void Sums_agree_with_whole_numbers()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 2, 9, 40 })
        {
            for (int limit = 0; limit <= trials; limit++)
            {
                foreach (int tenths in new[] { 1, 5, 9 })
                {
                    var moments = BinomialMoments.From(trials, limit, tenths / 10.0);
                    double[] sums = [0, 0, 0];
                    double first = Ways(trials, limit, tenths);
                    for (int k = limit; k <= trials; k++)
                    {
                        double share = Ways(trials, k, tenths) / first;
                        sums = [sums[0] + share, sums[1] + share * (k - limit),
                            sums[2] + share * (k - limit) * (k - limit)];
                    }

                    Assert.Equal(Math.Log(first) - trials * Math.Log(10), moments.Mass, 1e-12);
                    Assert.Equal(1, moments.Sum0 / sums[0], 1e-13);
                    Assert.Equal(sums[1], moments.Sum1, 1e-13 * sums[1]);
                    Assert.Equal(sums[2], moments.Sum2, 1e-13 * sums[2]);
                    seen++;
                }
            }
        }

        Assert.Equal(168, seen);
    }

    [Fact]
    public void Failures_of_one_rate_are_successes_of_the_other()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 2, 9, 40 })
        {
            for (int limit = 0; limit <= trials; limit++)
            {
                foreach (double rate in new[] { 0.25, 0.5, 0.875 })
                {
                    var failures = BinomialMoments.OfFailures(trials, limit, rate);
                    var successes = BinomialMoments.From(trials, limit, 1 - rate);
                    Assert.Equal(successes.Mass, failures.Mass, 1e-12);
                    Assert.Equal(limit - trials * (1 - rate), failures.Above);
                    Assert.Equal(limit - trials * (1 - rate), successes.Above);
                    Assert.Equal(1, failures.Sum0 / successes.Sum0, 1e-13);
                    Assert.Equal(successes.Sum1, failures.Sum1, 1e-13 * successes.Sum1);
                    Assert.Equal(successes.Sum2, failures.Sum2, 1e-13 * successes.Sum2);
                    seen++;
                }
            }
        }

        Assert.Equal(168, seen);
    }

    // At a rate of 1e-12 the failures' rate is no double: 1 - 1e-12 would be off by 2e-17, their mean by 2e-8.
    [Fact]
    public void The_mean_of_the_failures_keeps_the_digits_of_a_small_rate() =>
        Assert.Equal(1e-3, BinomialMoments.OfFailures(1_000_000_000, 1_000_000_000, 1e-12).Above, 1e-18);

    // C(n, k) · tenths^k · (10 - tenths)^(n-k), a whole number.
    static double Ways(int trials, int successes, int tenths)
    {
        System.Numerics.BigInteger ways = 1;
        for (int i = 0; i < successes; i++)
            ways = ways * (trials - i) / (i + 1);
        return (double)(ways * System.Numerics.BigInteger.Pow(tenths, successes)
            * System.Numerics.BigInteger.Pow(10 - tenths, trials - successes));
    }

    [Theory]
    [InlineData(1000, 300, 0.3)]
    [InlineData(1_000_000, 1, 1e-6)]
    [InlineData(1_000_000, 501_000, 0.5)]
    public void The_first_sum_is_the_tail_over_the_mass(long trials, long limit, double rate)
    {
        var moments = BinomialMoments.From(trials, limit, rate);

        Assert.Equal(Binomial.LogUpperTail(trials, limit, rate), moments.Mass + Math.Log(moments.Sum0), 2e-12);
    }
}
