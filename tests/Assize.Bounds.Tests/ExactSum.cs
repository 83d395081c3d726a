using System.Numerics;

namespace Assize.Bounds.Tests;

/// <summary>Sums of draws on 0, 1, 2, … with whole weights: every probability is a whole number over a power.</summary>
sealed class ExactSum
{
    readonly BigInteger[] _atLeast;

    public ExactSum(int[] weights, int trials) : this([(weights, trials)])
    {
    }

    public ExactSum(params (int[] Weights, int Trials)[] groups)
    {
        BigInteger[] ways = [1];
        foreach (var (weights, trials) in groups)
        {
            for (int i = 0; i < trials; i++)
                ways = Plus(ways, weights);
        }

        _atLeast = new BigInteger[ways.Length + 1];
        for (int total = ways.Length - 1; total >= 0; total--)
            _atLeast[total] = _atLeast[total + 1] + ways[total];
    }

    public int Greatest => _atLeast.Length - 2;

    /// <summary>The sign of P(S ≥ total) minus a probability, without rounding.</summary>
    public int CompareAtLeast(int total, double probability) => CompareOutside(-1, total, probability);

    /// <summary>The sign of P(S ≤ low) + P(S ≥ high) minus a probability, without rounding.</summary>
    public int CompareOutside(int low, int high, double probability)
    {
        var ways = Tail(0) - Tail(low + 1) + Tail(high);
        int exponent = 0;
        while (Math.Floor(probability) != probability)
            (probability, exponent) = (probability * 2, exponent + 1);

        return (ways << exponent).CompareTo(new BigInteger(probability) * _atLeast[0]);
    }

    /// <summary>The sign of P(S ≤ total) minus a probability, without rounding.</summary>
    public int CompareAtMost(int total, double probability) => CompareOutside(total, Greatest + 1, probability);

    public double AtLeast(int total) => Math.Exp(BigInteger.Log(Tail(total)) - BigInteger.Log(Tail(0)));

    BigInteger Tail(int total) => total > Greatest ? 0 : _atLeast[Math.Max(0, total)];

    static BigInteger[] Plus(BigInteger[] ways, int[] weights)
    {
        var sum = new BigInteger[ways.Length + weights.Length - 1];
        for (int i = 0; i < ways.Length; i++)
        {
            for (int j = 0; j < weights.Length; j++)
                sum[i + j] += ways[i] * weights[j];
        }

        return sum;
    }
}
