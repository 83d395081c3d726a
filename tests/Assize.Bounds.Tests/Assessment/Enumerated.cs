namespace Assize.Bounds.Tests.Assessment;

/// <summary>Distributions put together value by value: sums of positive terms only, so that they are right to 1e-13.</summary>
static class Enumerated
{
    /// <summary>The distribution of the sum of draws from equally spaced points: index 0 is the least sum.</summary>
    public static double[] Sum(double[] shares, int draws)
    {
        double[] sum = [1];
        for (int draw = 0; draw < draws; draw++)
        {
            double[] next = new double[sum.Length + shares.Length - 1];
            for (int i = 0; i < sum.Length; i++)
            {
                for (int j = 0; j < shares.Length; j++)
                    next[i + j] += sum[i] * shares[j];
            }

            sum = next;
        }

        return sum;
    }

    public static double Where(double[] distribution, Func<int, bool> holds) =>
        distribution.Where((_, i) => holds(i)).Sum();

    /// <summary>P(some count outside) of a multinomial, by every way to share out the trials.</summary>
    public static double AnyOutside(double[] shares, int trials, long low, long high)
    {
        double[] factorial = new double[trials + 1];
        factorial[0] = 1;
        for (int i = 1; i <= trials; i++)
            factorial[i] = factorial[i - 1] * i;
        double Red(int bucket, int left, double weight, bool outside)
        {
            if (bucket == shares.Length - 1)
                return outside || left < low || left > high ? weight * Math.Pow(shares[bucket], left) / factorial[left] : 0;

            double red = 0;
            for (int count = 0; count <= left; count++)
                red += Red(bucket + 1, left - count, weight * Math.Pow(shares[bucket], count) / factorial[count], outside || count < low || count > high);
            return red;
        }

        return Red(0, trials, factorial[trials], false);
    }

    public static void Contains(Enclosure enclosure, double truth, string what)
    {
        double slack = 1e-12 * truth + 1e-15;
        Assert.True(enclosure.Lower <= truth + slack && truth <= enclosure.Upper + slack, $"{what}: {truth} not in [{enclosure.Lower}, {enclosure.Upper}]");
    }
}
