namespace Assize.Bounds;

/// <summary>Logarithm and exponential that give the same bits on every system; Math.Log and Math.Exp do not promise
/// that.</summary>
/// <remarks>Only IEEE 754 additions, products, quotients and exponent shifts are used. Largest error seen: 1 unit in
/// the last place.</remarks>
public static class Elementary
{
    // The upper part has 21 trailing zero bits, so that its product with an exponent is exact.
    const double LogTwoUpper = 0.693147180369123816490;
    const double LogTwoLower = 1.90821492927058770002e-10;
    const long BitsOfRootHalf = 0x3FE6A09E667F3BCD;
    const double LeastNormal = 2.2250738585072014e-308;

    /// <summary>The natural logarithm.</summary>
    /// <param name="value">A number in [0, ∞].</param>
    /// <returns>ln(value), in [-∞, ∞].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value is negative or NaN.</exception>
    public static double Log(double value)
    {
        Check.Between(value, 0, double.PositiveInfinity, nameof(value));
        if (value == 0)
            return double.NegativeInfinity;
        if (value > double.MaxValue)
            return value;

        int exponent = 0;
        if (value < LeastNormal)
            (value, exponent) = (value * 18014398509481984, -54);

        long bits = BitConverter.DoubleToInt64Bits(value);
        int shift = (int)((bits - BitsOfRootHalf) >> 52);
        double fraction = BitConverter.Int64BitsToDouble(bits - ((long)shift << 52)) - 1;
        return LogOnePlusFraction(fraction, exponent + shift);
    }

    /// <summary>The natural logarithm of one more than a number, accurate however small the number is.</summary>
    /// <param name="value">A number in [-1, ∞].</param>
    /// <returns>ln(1 + value), in [-∞, ∞].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value is below -1 or NaN.</exception>
    public static double LogOnePlus(double value)
    {
        Check.Between(value, -1, double.PositiveInfinity, nameof(value));
        if (value > -0.29 && value < 0.41)
            return LogOnePlusFraction(value, 0);

        double sum = 1 + value;
        if (value == -1 || sum > 9007199254740992)
            return Log(sum);

        double lost = value >= 1 ? 1 - (sum - value) : value - (sum - 1);
        return Log(sum) + lost / sum;
    }

    /// <summary>The exponential.</summary>
    /// <param name="value">A number in [-∞, ∞].</param>
    /// <returns>e^value, in [0, ∞]; 0 below -745.2.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value is NaN.</exception>
    public static double Exp(double value)
    {
        Check.Between(value, double.NegativeInfinity, double.PositiveInfinity, nameof(value));
        if (value > 709.79)
            return double.PositiveInfinity;
        if (value < -745.2)
            return 0;

        int exponent = NearestExponent(value);
        double result = 1 + ExpMinusOneReduced(value, exponent);
        return exponent >= -1021
            ? result * PowerOfTwo(exponent - 1) * 2
            : result * PowerOfTwo(exponent + 64) * PowerOfTwo(-64);
    }

    /// <summary>One less than the exponential, accurate however small the number is.</summary>
    /// <param name="value">A number in [-∞, ∞].</param>
    /// <returns>e^value - 1, in [-1, ∞].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value is NaN.</exception>
    public static double ExpMinusOne(double value)
    {
        if (value < -40)
            return -1;
        if (!(value < 40))
            return Exp(value) - 1;

        int exponent = NearestExponent(value);
        double scale = PowerOfTwo(exponent);
        return scale * ExpMinusOneReduced(value, exponent) + (scale - 1);
    }

    /// <summary>How far ln(1 + value) falls short of the value, without the cancellation of subtracting them.</summary>
    /// <param name="value">A number in [-1, ∞].</param>
    /// <returns>value - ln(1 + value), in [0, ∞].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value is below -1 or NaN.</exception>
    public static double LogShortfall(double value)
    {
        if (!(value > -0.5 && value < 1))
            return value - LogOnePlus(value);

        double s = value / (2 + value);
        double z = s * s;
        double series = z < 0.01 ? ShortSeries(z) : LongSeries(z);
        return s * (value - 2 * z * series);
    }

    /// <summary>How far the exponential exceeds its tangent at 0, without the cancellation of subtracting it.</summary>
    /// <param name="value">A number in [-∞, ∞].</param>
    /// <returns>e^value - 1 - value, in [0, ∞].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The value is NaN.</exception>
    public static double ExpExcess(double value)
    {
        if (!(value > -0.7 && value < 0.7))
            return double.IsPositiveInfinity(value) ? value : ExpMinusOne(value) - value;

        // v²/2 + v³/6 + …: 18 terms suffice for |v| ≤ 0.7.
        double sum = 0;
        for (int k = 20; k >= 3; k--)
            sum = (sum + 1) * value / k;
        return value * value / 2 * (1 + sum);
    }

    // ln(1 + f) = 2 artanh(s), s = f / (2 + f): exact fractions 2/(2j + 1), enough of them for |s| ≤ 0.172.
    static double LogOnePlusFraction(double f, int exponent)
    {
        double s = f / (2 + f);
        double z = s * s;
        double w = z * z;
        double odd = z * (2.0 / 3 + w * (2.0 / 7 + w * (2.0 / 11 + w * (2.0 / 15 + w * (2.0 / 19)))));
        double even = w * (2.0 / 5 + w * (2.0 / 9 + w * (2.0 / 13 + w * (2.0 / 17 + w * (2.0 / 21)))));
        double half = 0.5 * f * f;
        double tail = s * (half + (odd + even));
        return exponent == 0
            ? f - (half - tail)
            : exponent * LogTwoUpper - (half - (tail + exponent * LogTwoLower) - f);
    }

    static int NearestExponent(double value) => (int)Math.Floor(value / (LogTwoUpper + LogTwoLower) + 0.5);

    // e^r - 1 by its Taylor series, |r| ≤ 0.3466, where value = exponent · ln 2 + r.
    static double ExpMinusOneReduced(double value, int exponent)
    {
        double upper = value - exponent * LogTwoUpper;
        double lower = exponent * LogTwoLower;
        double r = upper - lower;
        double lost = upper - r - lower;
        double w = r * r;
        double even = 1.0 / 2
            + w * (1.0 / 24 + w * (1.0 / 720 + w * (1.0 / 40320 + w * (1.0 / 3628800 + w / 479001600))));
        double odd = 1.0 / 6
            + w * (1.0 / 120 + w * (1.0 / 5040 + w * (1.0 / 362880 + w * (1.0 / 39916800 + w / 6227020800))));
        return r + (lost + w * (even + r * odd));
    }

    static double PowerOfTwo(int exponent) => BitConverter.Int64BitsToDouble((long)(exponent + 1023) << 52);

    // 1/3 + z/5 + z²/7 + …
    static double ShortSeries(double z) =>
        1.0 / 3
        + z * (1.0 / 5 + z * (1.0 / 7 + z * (1.0 / 9 + z * (1.0 / 11 + z * (1.0 / 13 + z * (1.0 / 15 + z / 17))))));

    static double LongSeries(double z)
    {
        double sum = 0;
        for (int denominator = 39; denominator >= 3; denominator -= 2)
            sum = sum * z + 1.0 / denominator;
        return sum;
    }
}
