namespace Assize.Bounds.Tests;

public class BinomialTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    [Fact]
    public void Tails_and_mass_agree_with_eighty_digits()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("binomial_tail"))
        {
            var (n, k, p) = (row.Whole("n"), row.Whole("k"), row.Number("p"));
            AssertLog(Binomial.LogLowerTail(n, k, p), row.Number("ln_p_le"), row);
            AssertLog(Binomial.LogUpperTail(n, k, p), row.Number("ln_p_ge"), row);
            AssertLog(Binomial.LogMass(n, k, p), row.Number("ln_pmf"), row);
            AssertSame(Binomial.LowerTail(n, k, p), Binomial.LogLowerTail(n, k, p), row);
            AssertSame(Binomial.UpperTail(n, k, p), Binomial.LogUpperTail(n, k, p), row);
            AssertSame(Binomial.Mass(n, k, p), Binomial.LogMass(n, k, p), row);
            seen++;
        }

        Assert.Equal(625, seen);
    }

    [Fact]
    public void Tails_beyond_a_thousand_million_trials_agree_with_the_beta_integral()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("binomial_large"))
        {
            var (n, k, p) = (row.Whole("n"), row.Whole("k"), row.Number("p"));
            AssertLog(Binomial.LogUpperTail(n, k, p), row.Number("ln_p_ge"), row);
            AssertLog(Binomial.LogMass(n, k, p), row.Number("ln_pmf"), row);
            seen++;
        }

        Assert.Equal(96, seen);
    }

    [Fact]
    public void Lower_tails_agree_with_an_independent_library_where_that_can_be_trusted()
    {
        int seen = 0;
        foreach (int trials in new[] { 1, 7, 50, 400, 1000 })
        {
            foreach (double rate in new[] { 0.001, 0.2, 0.5, 0.77 })
            {
                for (int successes = 0; successes < trials; successes += 1 + trials / 40)
                {
                    double reference = MathNet.Numerics.Distributions.Binomial.CDF(rate, trials, successes);
                    double computed = Binomial.LowerTail(trials, successes, rate);
                    // MathNet.Numerics 5.0.0 was measured at 1.5e-12 up to 1,000 trials.
                    Assert.True(reference < 1e-300 || ReferenceTable.RelativeError(computed, reference) < 2e-12,
                        $"{trials} {successes} {rate}: {computed:R} against {reference:R}");
                    seen++;
                }
            }
        }

        Assert.Equal(436, seen);
    }

    [Theory]
    [InlineData(10, 0, 0.3)]
    [InlineData(10, 10, 0.3)]
    [InlineData(1, 1, 0.5)]
    [InlineData(1000, 499, 0.5)]
    [InlineData(1000, 501, 0.5)]
    [InlineData(1_000_000_000, 1, 1e-9)]
    [InlineData(1_000_000_000, 500_000_000, 0.5)]
    public void Both_tails_add_up(long trials, long successes, double rate) =>
        Assert.Equal(
            1, Binomial.LowerTail(trials, successes - 1, rate) + Binomial.UpperTail(trials, successes, rate), 1e-12);

    [Fact]
    public void Counts_and_rates_at_the_ends_are_exact()
    {
        Assert.Equal(1, Binomial.UpperTail(5, 0, 0.3));
        Assert.Equal(1, Binomial.UpperTail(5, -3, 0.3));
        Assert.Equal(0, Binomial.UpperTail(5, 6, 0.3));
        Assert.Equal(0, Binomial.LowerTail(5, -1, 0.3));
        Assert.Equal(1, Binomial.LowerTail(5, 5, 0.3));
        Assert.Equal(1, Binomial.LowerTail(5, 9, 0.3));
        Assert.Equal((1, 0), (Binomial.UpperTail(5, 5, 1), Binomial.LowerTail(5, 4, 1)));
        Assert.Equal((0, 1), (Binomial.UpperTail(5, 1, 0), Binomial.LowerTail(5, 0, 0)));
        Assert.Equal((1, 0), (Binomial.Mass(5, 0, 0), Binomial.Mass(5, 1, 0)));
        Assert.Equal((1, 0), (Binomial.Mass(5, 5, 1), Binomial.Mass(5, 4, 1)));
        Assert.Equal((1, 0), (Binomial.Mass(0, 0, 0.3), Binomial.Mass(0, 1, 0.3)));
        Assert.Equal(1, Binomial.UpperTail(0, 0, 0.3));
        Assert.Equal(0, Binomial.UpperTail(0, 1, 0.3));
        Assert.Equal(double.NegativeInfinity, Binomial.LogMass(5, 6, 0.3));
        Assert.Equal(double.NegativeInfinity, Binomial.LogUpperTail(5, 6, 0.3));
        Assert.Equal(double.NegativeInfinity, Binomial.LogLowerTail(5, -1, 0.3));
    }

    [Theory]
    [InlineData(-1, 0.5)]
    [InlineData((1L << 52) + 1, 0.5)]
    [InlineData(5, double.NaN)]
    [InlineData(5, -1e-300)]
    [InlineData(5, 1.0000000000000002)]
    public void Arguments_outside_the_domain_are_refused(long trials, double rate)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => Binomial.Mass(trials, 1, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => Binomial.LogMass(trials, 1, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => Binomial.UpperTail(trials, 1, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => Binomial.LowerTail(trials, 1, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => Binomial.LogUpperTail(trials, 1, rate));
        Assert.Throws<ArgumentOutOfRangeException>(() => Binomial.LogLowerTail(trials, 1, rate));
    }

    // An error in the logarithm is a relative error of the probability; near 0 the logarithm itself must be accurate.
    static void AssertLog(double computed, double truth, ReferenceTable.Row row)
    {
        double allowed = Accuracy * Math.Max(Math.Min(1, Math.Abs(truth)), Math.Abs(truth) / 690);
        Assert.True(
            computed == truth || Math.Abs(computed - truth) <= allowed, $"{row}: {computed:R} against {truth:R}");
    }

    static void AssertSame(double probability, double logarithm, ReferenceTable.Row row)
    {
        if (logarithm > -690)
            Assert.True(
                ReferenceTable.RelativeError(probability, Math.Exp(logarithm)) < 1e-12, $"{row}: {probability:R}");
        else
            Assert.True(probability <= 1e-299, $"{row}: {probability:R}");
    }
}
