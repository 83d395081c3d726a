namespace Assize.Bounds.Tests;

public class BinomialLimitsTests
{
    // The documented accuracy.
    const double Accuracy = 2e-12;

    [Fact]
    public void Limits_enclose_those_of_eighty_digits_closely() => Assert.Empty(ReferenceTable.Misses(
        "clopper_pearson", Accuracy, 304, row =>
    {
        var (trials, successes, risk) = (row.Whole("n"), row.Whole("k"), row.Number("alpha") / 2);
        double lower = BinomialLimits.Lower(trials, successes, risk);
        double upper = BinomialLimits.Upper(trials, successes, risk);
        Assert.True(lower <= row.Number("lower") && upper >= row.Number("upper"), $"{row}: {lower:R} {upper:R}");
        double other = BinomialLimits.Lower(trials, trials - successes, risk);
        Assert.True(other <= row.Number("one_minus_upper"), $"{row}: {other:R}");
        return new[]
        {
            ReferenceTable.RelativeError(lower, row.Number("lower")),
            ReferenceTable.RelativeError(upper, row.Number("upper")),
            ReferenceTable.RelativeError(other, row.Number("one_minus_upper")),
        }.Max();
    }));

    [Fact]
    public void The_tail_at_a_limit_is_at_most_the_risk_by_whole_numbers()
    {
        int seen = 0;
        foreach (double risk in new[] { 0.5, 0.05, 1e-6, 1e-12 })
        {
            for (int trials = 1; trials <= 30; trials++)
            {
                for (int successes = 1; successes <= trials; successes++)
                {
                    double limit = BinomialLimits.Lower(trials, successes, risk);
                    Assert.True(Exceeds(trials, successes, limit, risk) <= 0,
                        $"{successes}/{trials} {risk}: {limit:R}");
                    Assert.True(Exceeds(trials, successes, limit + 4e-12 * Math.Min(limit, 1 - limit) + 3e-16,
                        risk) > 0);
                    seen++;
                }
            }
        }

        Assert.Equal(1860, seen);
    }

    // The sign of P(S ≥ successes) - risk, exactly: rate and risk are whole numbers over a power of 2.
    static int Exceeds(int trials, int successes, double rate, double risk)
    {
        const int bits = 1074;
        var one = System.Numerics.BigInteger.One << bits;
        var (p, wanted) = (Whole(rate), Whole(risk));
        System.Numerics.BigInteger sum = 0, ways = 1;
        for (int k = 0; k <= trials; k++)
        {
            if (k >= successes)
                sum += ways * System.Numerics.BigInteger.Pow(p, k)
                    * System.Numerics.BigInteger.Pow(one - p, trials - k);
            ways = ways * (trials - k) / (k + 1);
        }

        return sum.CompareTo(wanted << (bits * (trials - 1)));
    }

    static System.Numerics.BigInteger Whole(double value)
    {
        long bits = BitConverter.DoubleToInt64Bits(value);
        int exponent = (int)(bits >> 52);
        var mantissa = new System.Numerics.BigInteger((bits & ((1L << 52) - 1)) | (exponent == 0 ? 0 : 1L << 52));
        return mantissa << Math.Max(0, exponent - 1);
    }

    // Without a failure the limit is the n-th root of the risk, and 1 minus it has a formula of its own.
    [Theory]
    [InlineData(1, 0.5)]
    [InlineData(3, 1e-6)]
    [InlineData(1000, 1e-250)]
    [InlineData(1_000_000_000, 0.01)]
    public void Limits_without_a_failure_are_roots(long trials, double risk)
    {
        double other = -Elementary.ExpMinusOne(Math.Log(risk) / trials);

        Assert.Equal(1, BinomialLimits.Upper(trials, 0, risk) / other, Accuracy);
        Assert.True(BinomialLimits.Upper(trials, 0, risk) >= other);
        Assert.Equal(1, BinomialLimits.Lower(trials, trials, risk) / Math.Pow(risk, 1.0 / trials), Accuracy);
        Assert.Equal((0, 1), (BinomialLimits.Lower(trials, 0, risk), BinomialLimits.Upper(trials, trials, risk)));
    }

    [Fact]
    public void Limits_widen_as_the_risk_falls_and_rise_with_the_successes()
    {
        double before = 0;
        for (int successes = 0; successes <= 200; successes++)
        {
            double limit = BinomialLimits.Lower(200, successes, 0.01);
            Assert.True(limit >= before && limit >= BinomialLimits.Lower(200, successes, 0.001));
            Assert.True(limit < BinomialLimits.Upper(200, successes, 0.01));
            before = limit;
        }
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (var (trials, successes, risk, name) in new[]
        {
            (0L, 0L, 0.1, "trials"), ((1L << 52) + 1, 1, 0.1, "trials"), (5, -1, 0.1, "successes"),
                (5, 6, 0.1, "successes"),
            (5, 1, 0, "risk"), (5, 1, 0.51, "risk"), (5, 1, double.NaN, "risk"), (5, 1, -1, "risk"),
        })
        {
            Assert.Throws<ArgumentOutOfRangeException>(name, () => BinomialLimits.Lower(trials, successes, risk));
            Assert.Throws<ArgumentOutOfRangeException>(name, () => BinomialLimits.Upper(trials, successes, risk));
        }
    }
}
