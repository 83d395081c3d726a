using System.Numerics;

namespace Assize.Bounds.Tests;

public class PointsTests
{
    // Shares in sixteenths are exact, so moments are rational: numerators over 16, 16·16², 16·16³.
    [Fact]
    public void Moments_agree_with_whole_numbers()
    {
        var random = new Random(81);
        int seen = 0;
        for (int i = 0; i < 2000; i++)
        {
            var sixteenths = Enumerable.Range(0, 16).GroupBy(_ => random.Next(-1000, 1000)).ToDictionary(
                group => group.Key, group => group.Count());
            var law = Law.OnPoints(sixteenths.ToDictionary(pair => (double)pair.Key, pair => pair.Value / 16.0));
            BigInteger mean = sixteenths.Aggregate(BigInteger.Zero, (sum, pair) => sum + pair.Key * pair.Value);
            BigInteger Central(int power) => sixteenths.Aggregate(
                BigInteger.Zero, (sum, pair) =>
                    sum + pair.Value * BigInteger.Abs(BigInteger.Pow(16 * pair.Key - mean, power)));

            LawContract.Close((double)mean / 16, law.Mean, 1e-12, "mean");
            LawContract.Close((double)Central(2) / 4096, law.Variance, 1e-13 * law.Variance, "variance");
            LawContract.Close((double)Central(3) / 65536, law.ThirdAbsoluteCentralMoment,
                1e-13 * law.ThirdAbsoluteCentralMoment, "third moment");
            Assert.Equal((sixteenths.Keys.Min(), sixteenths.Keys.Max()), (law.Minimum, law.Maximum));
            seen++;
        }

        Assert.Equal(2000, seen);
    }

    [Fact]
    public void Cumulants_agree_with_sums()
    {
        (double Value, double Weight)[] masses = [(-2, 0.25), (0.5, 0.5), (5.5, 0.25)];
        var law = Law.OnPoints(masses.ToDictionary(mass => mass.Value, mass => mass.Weight));

        LawContract.AgreesWithSums(law, masses, 1e-14, 0.01, 0.3, -0.3, 5, -5);
        LawContract.TurnsOnItsLattice(law, masses, -2, 2.5);
    }

    [Fact]
    public void Whole_numbers_are_equally_likely()
    {
        (double, double)[] masses = [.. Enumerable.Range(1, 6).Select(side => ((double)side, 1.0))];

        LawContract.AgreesWithSums(Law.WholeNumbers(1, 6), masses, 1e-14, 0.01, 1, -3);
        LawContract.TurnsOnItsLattice(Law.WholeNumbers(1, 6), masses, 1, 1);
        Assert.Equal((3.5, 35.0 / 12), (Law.WholeNumbers(1, 6).Mean, Law.WholeNumbers(1, 6).Variance), Near);
        // Σ over m = (n² - 1)/12 for n numbers, here 1,000,001 of them.
        Assert.Equal(1, Law.WholeNumbers(-500_000, 500_000).Variance / (1_000_001.0 * 1_000_001 - 1) * 12, 1e-10);
    }

    static bool Near((double, double) a, (double, double) b) =>
        Math.Abs(a.Item1 - b.Item1) + Math.Abs(a.Item2 - b.Item2) < 1e-14;

    [Fact]
    public void A_large_offset_costs_no_digit_of_the_spread() =>
        Assert.Equal(35.0 / 12, Law.WholeNumbers(1_000_000_000_001, 1_000_000_000_006).Variance, 1e-14);

    [Fact]
    public void Tilted_laws_follow_the_cumulant()
    {
        LawContract.TiltsConsistently(Law.WholeNumbers(1, 6), 1, -2, 0);
        LawContract.TiltsConsistently(
            Law.OnPoints(new Dictionary<double, double> { [0] = 0.999, [1000] = 0.001 }), 0.005, -0.001);
    }

    [Fact]
    public void Far_tilts_neither_overflow_nor_lose_the_end()
    {
        var law = Law.WholeNumbers(1, 6);

        Assert.Equal(6e5 - Math.Log(6), law.LogMoment(1e5), 1e-9);
        Assert.Equal((6, 1), (law.Tilted(1e5).Mean, law.Tilted(-1e5).Mean));
    }

    // Beyond a tilt of 60 only the last two values count: a trial of rate e^-tilt.
    [Theory]
    [InlineData(60)]
    [InlineData(-60)]
    [InlineData(600)]
    public void A_far_tilt_keeps_a_variance(double tilt)
    {
        double rate = Math.Exp(-Math.Abs(tilt));
        var law = Law.WholeNumbers(1, 6).Tilted(tilt);

        Assert.Equal(1, law.Variance / rate, 1e-12);
        Assert.Equal(1, law.ThirdAbsoluteCentralMoment / rate, 1e-12);
        Assert.Equal(1, law.CentralLogMoment(0.01)
            / (rate * (Math.Exp(-Math.Sign(tilt) * 0.01) - 1 + Math.Sign(tilt) * 0.01)), 1e-10);
    }

    [Fact]
    public void Values_that_are_not_evenly_spaced_have_no_step()
    {
        Assert.Null(Step(0, 1, 2.5));
        Assert.Equal(0.5, Step(0, 0.5, 2.5));
        Assert.Equal(1, Step(4));
        Assert.Equal(0.1, Step(0, 0.1, 0.3)!.Value, 1e-15);

        static double? Step(params double[] values) =>
            ((ILattice)Law.OnPoints(values.ToDictionary(value => value, _ => 1.0 / values.Length))).Step;
    }

    [Fact]
    public void Values_without_a_share_are_left_out()
    {
        var law = Law.OnPoints(new Dictionary<double, double> { [-9] = 0, [1] = 0.5, [2] = 0.5, [99] = 0 });

        Assert.Equal((1, 2), (law.Minimum, law.Maximum));
    }

    [Fact]
    public void Shares_that_are_none_are_refused()
    {
        foreach (var (value, share) in new[] { (double.NaN, 0.5), (1.01e100, 0.5), (1, -0.5), (1, double.NaN),
            (1, 1.5), (1, 0.4), (1, 0.50001) })
            Assert.ThrowsAny<ArgumentException>(
                () => Law.OnPoints(new Dictionary<double, double> { [0] = 0.5, [value] = share }));
        Assert.Throws<ArgumentNullException>(() => Law.OnPoints(null!));
        Assert.Throws<ArgumentException>(() => Law.OnPoints(new Dictionary<double, double>()));
        string message = Assert.Throws<ArgumentException>(
            () => Law.OnPoints(new Dictionary<double, double> { [0] = 0.25 })).Message;
        Assert.Contains("add up to 0.25", message, StringComparison.Ordinal);
    }

    [Fact]
    public void Whole_numbers_outside_the_domain_are_refused()
    {
        foreach (var (lower, upper) in new[]
        {
            (2L, 1L), (0, 1_000_001), (long.MinValue, long.MaxValue), (long.MaxValue - 1, long.MaxValue),
                (long.MinValue, long.MinValue + 1),
        })
            Assert.Throws<ArgumentOutOfRangeException>(() => Law.WholeNumbers(lower, upper));
        LawContract.RefusesTiltsWithoutALaw(Law.WholeNumbers(1, 6), double.PositiveInfinity);
    }
}
