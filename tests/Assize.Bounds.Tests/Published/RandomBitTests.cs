using System.Numerics;

namespace Assize.Bounds.Tests.Published;

/// <summary>NIST SP 800-22 rev. 1a (2010), worked examples of section 2 (from memory), the exact value beside the
/// approximate one.</summary>
public class RandomBitTests
{
    // 2.1: 10 bits with a sum of 2, and the first 100 bits of π with a sum of -16.
    [Theory]
    [InlineData(10, 2, 0.527089)]
    [InlineData(100, 16, 0.109599)]
    public void Frequency(int bits, int sum, double printed)
    {
        double approximate = 2 * NormalTail.Upper(sum / Math.Sqrt(bits));
        int ones = (bits + sum) / 2;
        var exact = BinomialTail.Outside(bits, bits - ones + 1, ones - 1, 0.5);

        Assert.Equal(printed, approximate, 5e-7);
        Assert.Equal((double)Outside(bits, ones) / Math.Pow(2, bits), exact.Upper, 1e-11);
        Assert.True(exact.Lower > 1.2 * approximate, $"{exact}");
        double distance = BerryEsseen.Distance(Law.Bernoulli(0.5), bits);
        Assert.InRange(exact.Upper - approximate, 0, 2 * distance);
    }

    static BigInteger Outside(int bits, int ones)
    {
        BigInteger ways = 1, sum = 0;
        for (int k = 0; k <= bits; k++)
        {
            sum += k >= ones || bits - k >= ones ? ways : 0;
            ways = ways * (bits - k) / (k + 1);
        }

        return sum;
    }

    // 2.2 and 2.4: chi-squared of 1 in 3 blocks, of 7.2 in 10 blocks, and of 4.882457 over 3 degrees of freedom.
    [Theory]
    [InlineData(3, 1, 0.801252)]
    [InlineData(10, 7.2, 0.706438)]
    [InlineData(3, 4.882457, 0.180609)]
    public void Blocks(int freedom, double statistic, double printed) =>
        Assert.Equal(printed, IncompleteGamma.UpperTail(freedom / 2.0, statistic / 2), 1e-6);

    // Blocks of 10 with a share p each: 4·10 Σ (p - ½)² ≥ 7.2 in 10 blocks, exactly, by the law of one block's square.
    [Fact]
    public void Blocks_exactly()
    {
        var squares = Enumerable.Range(0, 11).GroupBy(ones => (ones - 5) * (ones - 5)).ToDictionary(
            group => (double)group.Key, group => group.Sum(ones => Binomial.Mass(10, ones, 0.5)));
        var exact = LatticeSum.UpperTail(Draws.Of(Law.OnPoints(squares), 10), 18);

        int[] weights = new int[26];
        for (int ones = 0, ways = 1; ones <= 10; ways = ways * (10 - ones) / (ones + 1), ones++)
            weights[(ones - 5) * (ones - 5)] += ways;
        var sum = new ExactSum(weights, 10);
        Assert.True(sum.CompareAtLeast(18, exact.Lower) >= 0 && sum.CompareAtLeast(18, exact.Upper) <= 0);
        Assert.InRange(exact.Lower / 0.706438, 0.95, 1.05);
        Assert.NotEqual(0.706438, exact.Lower, 1e-3);
    }
}
