namespace Assize.Bounds.Tests;

public class DrawsTests
{
    static readonly Draws Mixed = Draws.Of(
        [(Law.WholeNumbers(1, 6), 3), (Law.Bernoulli(0.25), 8), (Law.Uniform(-1, 0), 2)]);

    [Fact]
    public void Moments_of_the_sum_add_up()
    {
        Assert.Equal(3 * 3.5 + 8 * 0.25 - 2 * 0.5, Mixed.Mean, 1e-14);
        Assert.Equal(3 * 35.0 / 12 + 8 * 3.0 / 16 + 2.0 / 12, Mixed.Variance, 1e-13);
        // A die: (2·(2.5³ + 1.5³ + 0.5³))/6 = 6.375; a trial: pq(p² + q²); a uniform draw: 1/32.
        Assert.Equal(3 * 6.375 + 8 * (3.0 / 16 * 10 / 16) + 2.0 / 32, Mixed.ThirdAbsoluteCentralMoments, 1e-13);
        Assert.Equal((3 - 2, 18 + 8), (Mixed.Minimum, Mixed.Maximum));
        Assert.Equal((3, false), (Mixed.Groups.Count, Mixed.Identical));
    }

    [Fact]
    public void Draws_of_one_law_are_identical()
    {
        var draws = Draws.Of(Law.Bernoulli(0.5), 1L << 52);

        Assert.True(draws.Identical);
        Assert.Equal(Math.Pow(2, 51), draws.Mean);
        Assert.Equal(1L << 52, draws.Groups.Single().Count);
    }

    [Fact]
    public void Sums_of_unbounded_draws_are_unbounded()
    {
        var draws = Draws.Of([(Law.Exponential(1), 1), (Law.Bernoulli(0.5), 1)]);

        Assert.Equal((0, double.PositiveInfinity), (draws.Minimum, draws.Maximum));
    }

    // Two dice, all 36 throws.
    [Fact]
    public void Cumulants_and_tilted_means_agree_with_sums_over_all_outcomes()
    {
        var draws = Draws.Of(Law.WholeNumbers(1, 6), 2);
        int[] throws = [.. from first in Enumerable.Range(1, 6) from second in Enumerable.Range(1, 6) select first
            + second];
        foreach (double tilt in new[] { 0.01, 0.7, -2 })
        {
            double moment = throws.Average(sum => Math.Exp(tilt * (sum - 7)));
            Assert.Equal(Math.Log(moment), draws.CentralLogMoment(tilt), 1e-14);
            Assert.Equal(throws.Average(sum => sum * Math.Exp(tilt * (sum - 7))) / moment, draws.Tilted(tilt).Mean,
                1e-13);
            Assert.Equal(-draws.Tilted(tilt).Mean, draws.Mirrored().Tilted(-tilt).Mean, 1e-13);
        }

        Assert.Equal((-12, -2), (draws.Mirrored().Minimum, draws.Mirrored().Maximum));
    }

    [Fact]
    public void The_distance_of_the_mean_from_a_total_keeps_its_digits()
    {
        // 0.1 as a double is 1/10 + 1/(5·2^55): a million million of them exceed 10^11 by 10^12/(5·2^55).
        double excess = Draws.Of(Law.Bernoulli(0.1), 1_000_000_000_000).MeanExcess(100_000_000_000);
        Assert.Equal(1e12 / 5 * Math.Pow(2, -55), excess, 1e-9);

        Assert.Equal(11.5 - 9, Mixed.MeanExcess(9), 1e-14);
    }

    [Fact]
    public void What_is_no_draw_is_refused()
    {
        Assert.Throws<ArgumentException>(() => Draws.Of([]));
        Assert.Throws<ArgumentException>(() => Draws.Of(null!));
        Assert.Throws<ArgumentNullException>(() => Draws.Of(null!, 3));
        foreach (long count in new[] { 0, -1, (1L << 52) + 1, long.MinValue })
            Assert.Throws<ArgumentOutOfRangeException>(() => Draws.Of(Law.Bernoulli(0.5), count));
    }
}
