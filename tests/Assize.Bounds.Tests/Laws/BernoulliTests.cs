namespace Assize.Bounds.Tests;

public class BernoulliTests
{
    [Theory]
    [InlineData(0.3)]
    [InlineData(0.5)]
    [InlineData(1e-9)]
    [InlineData(0.999)]
    public void Moments_are_sums_over_both_values(double rate)
    {
        var law = Law.Bernoulli(rate);

        Assert.Equal(rate, law.Mean);
        Assert.Equal(rate * Math.Pow(1 - rate, 2) + (1 - rate) * rate * rate, law.Variance, 1e-16);
        Assert.Equal(
            rate * Math.Pow(1 - rate, 3) + (1 - rate) * Math.Pow(rate, 3), law.ThirdAbsoluteCentralMoment, 1e-16);
        Assert.Equal((0, 1), (law.Minimum, law.Maximum));
    }

    [Theory]
    [InlineData(0.3, 2)]
    [InlineData(0.3, -2)]
    [InlineData(1e-9, 20)]
    [InlineData(0.999, 0)]
    public void The_cumulant_is_the_logarithm_of_the_expected_exponential(double rate, double tilt)
    {
        double expected = Math.Log(1 - rate + rate * Math.Exp(tilt));

        Assert.Equal(expected, Law.Bernoulli(rate).LogMoment(tilt), 1e-14);
    }

    [Fact]
    public void The_cumulant_does_not_overflow() =>
        Assert.Equal(1000 + Math.Log(0.3), Law.Bernoulli(0.3).LogMoment(1000), 1e-12);

    [Theory]
    [InlineData(0.3, 0.8)]
    [InlineData(0.01, -3)]
    public void The_mean_of_the_tilted_law_is_the_slope_of_the_cumulant(double rate, double tilt)
    {
        var law = Law.Bernoulli(rate);
        const double step = 1e-5;

        double slope = (law.LogMoment(tilt + step) - law.LogMoment(tilt - step)) / (2 * step);

        Assert.Equal(slope, law.Tilted(tilt).Mean, 1e-9);
        Assert.Equal(rate, law.Tilted(tilt).Tilted(-tilt).Mean, 1e-15);
    }

    [Fact]
    public void A_far_tilt_keeps_a_variance()
    {
        var law = Law.Bernoulli(0.5).Tilted(60);

        Assert.Equal(1, law.Mean);
        Assert.Equal(Math.Exp(-60), law.Variance, 1e-40);
    }

    // Success and failure change places: q = 2^-40 is exact, and so is 1 - q; the square left out is 2e-11 of the whole.
    [Theory]
    [InlineData(2)]
    [InlineData(-3)]
    [InlineData(25)]
    public void A_rate_next_to_one_costs_the_cumulant_no_digits(double tilt)
    {
        double rare = Math.Pow(2, -40);
        double expected = rare * (Math.Exp(-tilt) - 1 + tilt);

        Assert.Equal(1, Law.Bernoulli(1 - rare).CentralLogMoment(tilt) / expected, 1e-10);
        Assert.Equal(1, Law.Bernoulli(rare).CentralLogMoment(-tilt) / expected, 1e-10);
    }

    [Fact]
    public void Certain_draws_have_one_value()
    {
        Assert.Equal((0, 0, 0), (Law.Bernoulli(0).Minimum, Law.Bernoulli(0).Maximum, Law.Bernoulli(0).Variance));
        Assert.Equal((1, 1, 0), (Law.Bernoulli(1).Minimum, Law.Bernoulli(1).Maximum, Law.Bernoulli(1).Variance));
        Assert.Equal(0, Law.Bernoulli(0).Tilted(5).Mean);
        Assert.Equal(5, Law.Bernoulli(1).LogMoment(5));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double rate in new[] { -0.1, 1.1, double.NaN })
            Assert.Throws<ArgumentOutOfRangeException>(() => Law.Bernoulli(rate));
        foreach (double tilt in new[] { double.PositiveInfinity, double.NaN })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => Law.Bernoulli(0.5).LogMoment(tilt));
            Assert.Throws<ArgumentOutOfRangeException>(() => Law.Bernoulli(0.5).Tilted(tilt));
        }
    }
}
