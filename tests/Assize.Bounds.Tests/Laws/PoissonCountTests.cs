namespace Assize.Bounds.Tests;

public class PoissonCountTests
{
    static (double, double)[] Masses(double mean)
    {
        int last = (int)(mean + 60 * Math.Sqrt(mean) + 60);
        double[] logs = new double[last + 1];
        for (int k = 1; k <= last; k++)
            logs[k] = logs[k - 1] + Math.Log(mean / k);
        double greatest = logs.Max();
        return [.. logs.Select((log, k) => ((double)k, Math.Exp(log - greatest)))];
    }

    [Theory]
    [InlineData(1e-3)]
    [InlineData(0.5)]
    [InlineData(1)]
    [InlineData(3.7)]
    [InlineData(100)]
    public void Moments_and_cumulants_agree_with_sums_over_the_masses(double mean)
    {
        var law = Law.Poisson(mean);

        LawContract.AgreesWithSums(law, Masses(mean), 2e-12, 0.2, -1, 1e-4);
        LawContract.TurnsOnItsLattice(law, Masses(mean), 0, 1);
        Assert.Equal((0, double.PositiveInfinity), (law.Minimum, law.Maximum));
    }

    [Fact]
    public void A_large_mean_is_nearly_normal() => Assert.Equal(
        2 * Math.Sqrt(2 / Math.PI), Law.Poisson(1e9).ThirdAbsoluteCentralMoment / Math.Pow(1e9, 1.5), 1e-7);

    [Fact]
    public void Tilted_laws_follow_the_cumulant()
    {
        LawContract.TiltsConsistently(Law.Poisson(4), 1, -2, 0);
        LawContract.TiltsConsistently(Law.Poisson(1e-6), 10, -1);
    }

    [Fact]
    public void A_far_tilt_leaves_no_count() =>
        Assert.Equal((0, 0), (Law.Poisson(3).Tilted(-1e9).Mean, Law.Poisson(3).Tilted(-1e9).Variance));

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double mean in new[] { double.NaN, 0, -1, 1.01e9, double.PositiveInfinity })
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Law.Poisson(mean));
        LawContract.RefusesTiltsWithoutALaw(Law.Poisson(4), 30, 1000, double.PositiveInfinity);
    }
}
