using System.Numerics;

namespace Assize.Analyzers.Tests;

/// <summary>
/// Binomial probabilities in whole numbers: the rate is a fraction, nothing is rounded before the last division.
/// </summary>
static class ExactBinomial
{
    /// <summary>P(successes outside [low, high]) for a rate of over/under, as a double rounded once.</summary>
    public static double Outside(int trials, int low, int high, int over, int under)
    {
        BigInteger ways = 0, choose = 1;
        for (int successes = 0; successes <= trials; successes++)
        {
            if (successes < low || successes > high)
                ways += choose * BigInteger.Pow(over, successes) * BigInteger.Pow(under - over, trials - successes);
            choose = choose * (trials - successes) / (successes + 1);
        }

        return (double)((ways << 1074) / BigInteger.Pow(under, trials) >> 1000) * Math.Pow(2, -74);
    }

    /// <summary>The least N with N · P ≥ 1: the test is red in at least 1 of N runs.</summary>
    public static BigInteger RunsForAtLeast(int trials, int low, int high, int over, int under)
    {
        BigInteger ways = 0, choose = 1;
        for (int successes = 0; successes <= trials; successes++)
        {
            if (successes < low || successes > high)
                ways += choose * BigInteger.Pow(over, successes) * BigInteger.Pow(under - over, trials - successes);
            choose = choose * (trials - successes) / (successes + 1);
        }

        return (BigInteger.Pow(under, trials) + ways - 1) / ways;
    }
}
