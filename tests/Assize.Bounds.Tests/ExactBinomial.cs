using System.Numerics;

namespace Assize.Bounds.Tests;

/// <summary>Binomial probabilities in whole numbers: a double is a fraction m / 2^e, so every probability is one over
/// 2^(e·n).</summary>
sealed class ExactBinomial
{
    readonly BigInteger[] _atLeast;
    readonly int _bits;

    public ExactBinomial(int trials, double rate)
    {
        var (mantissa, exponent) = Fraction(rate);
        _bits = exponent * trials;
        _atLeast = new BigInteger[trials + 2];
        var hits = Powers(mantissa, trials);
        var misses = Powers((BigInteger.One << exponent) - mantissa, trials);
        BigInteger ways = 1;
        for (int successes = trials; successes >= 0; successes--)
        {
            _atLeast[successes] = _atLeast[successes + 1] + ways * hits[successes] * misses[trials - successes];
            ways = ways * successes / (trials - successes + 1);
        }
    }

    int Trials => _atLeast.Length - 2;

    /// <summary>The sign of P(low ≤ S ≤ high) minus a probability, without rounding.</summary>
    public int CompareBetween(long low, long high, double probability)
    {
        var ways = Tail(low) - Tail(high + 1);
        return (ways << 1074).CompareTo(Scaled(probability) << _bits);
    }

    /// <summary>The sign of P(S &lt; low) + P(S &gt; high) minus a probability, without rounding.</summary>
    public int CompareOutside(long low, long high, double probability)
    {
        var ways = Tail(0) - Tail(low) + Tail(high + 1);
        return (ways << 1074).CompareTo(Scaled(probability) << _bits);
    }

    public int CompareAtLeast(long successes, double probability) => CompareBetween(successes, Trials, probability);

    public int CompareAtMost(long successes, double probability) => CompareBetween(0, successes, probability);

    BigInteger Tail(long successes) => successes > Trials ? 0 : _atLeast[Math.Max(0, successes)];

    static BigInteger[] Powers(BigInteger value, int most)
    {
        var powers = new BigInteger[most + 1];
        powers[0] = 1;
        for (int i = 1; i <= most; i++)
            powers[i] = powers[i - 1] * value;

        return powers;
    }

    static (BigInteger Mantissa, int Exponent) Fraction(double value)
    {
        int exponent = 0;
        while (Math.Floor(value) != value)
            (value, exponent) = (value * 2, exponent + 1);

        return (new BigInteger(value), exponent);
    }

    // A double times 2^1074 is whole.
    static BigInteger Scaled(double value)
    {
        var (mantissa, exponent) = Fraction(value);
        return mantissa << (1074 - exponent);
    }
}
