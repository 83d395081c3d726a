namespace Assize.Bounds.Tests;

public class CentralSeriesTests
{
    // Two expansions of one integral that share no term: the series and the continued fraction.
    [Fact]
    public void Series_and_fraction_agree_wherever_the_series_is_used()
    {
        var random = new Random(3);
        int seen = 0;
        double worst = 0;
        while (seen < 2000)
        {
            long trials = (long)Math.Pow(10, 4 + 5 * random.NextDouble());
            double rate = random.Next(2) == 0 ? 0.001 + 0.998 * random.NextDouble() : Math.Pow(
                10, -4 * random.NextDouble() - 0.01);
            double deviation = Math.Sqrt(trials * rate * (1 - rate));
            long successes = (long)Math.Ceiling((trials + 1) * rate + 1.3 * random.NextDouble() * deviation);
            double excess = BinomialPoint.MeanExcess(trials, successes, rate);
            if (successes >= trials || CentralSeries.TailOverMass(successes, trials - successes, rate, 1 - rate, excess) is not { } series)
                continue;

            double fraction = BetaFraction.TailOverMass(successes, trials - successes, rate, 1 - rate, excess);
            worst = Math.Max(worst, ReferenceTable.RelativeError(series, fraction));
            seen++;
        }

        Assert.True(worst < 5e-14, $"{worst}");
    }

    [Theory]
    [InlineData(20_000, 10_001, true)]
    [InlineData(9_000, 4_501, false)]
    [InlineData(1_000_000, 500_600, true)]
    [InlineData(1_000_000, 500_650, false)]
    public void It_is_used_near_the_centre_of_a_wide_distribution_only(long trials, long successes, bool used) =>
        Assert.Equal(
            used,
            CentralSeries.TailOverMass(successes, trials - successes, 0.5, 0.5, trials / 2 - successes) is not null);

    [Theory]
    [InlineData(1_000_000_000, 500_000_001)]
    [InlineData(1_000_000_000_000_000, 500_000_000_000_001)]
    public void A_tail_from_the_centre_is_half_less_half_the_mass_there(long trials, long successes)
    {
        double half = 0.5 - Binomial.Mass(trials, trials / 2, 0.5) / 2;

        Assert.Equal(half, Binomial.UpperTail(trials, successes, 0.5), 1e-13);
    }
}
