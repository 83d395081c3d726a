namespace Assize.Bounds.Tests;

public class PoissonTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    [Fact]
    public void Tails_agree_with_eighty_digits() => Assert.Empty(ReferenceTable.Misses(
        "poisson_tail", Accuracy, 164, row =>
    {
        var (mean, count) = (row.Number("lambda"), row.Whole("k"));
        return Math.Max(
            ReferenceTable.LogError(Poisson.LogLowerTail(mean, count), row.Number("ln_p_le")),
            ReferenceTable.LogError(Poisson.LogUpperTail(mean, count), row.Number("ln_p_ge")));
    }));

    [Fact]
    public void Tails_are_the_exponentials_of_their_logarithms() => Assert.Empty(ReferenceTable.Misses(
        "poisson_tail", 1e-12, 164, row =>
    {
        var (mean, count) = (row.Number("lambda"), row.Whole("k"));
        var (lower, upper) = (row.Number("ln_p_le"), row.Number("ln_p_ge"));
        return Math.Max(
            lower < -690 ? 0 : ReferenceTable.RelativeError(Poisson.LowerTail(mean, count), Math.Exp(lower)),
            upper < -690 ? 0 : ReferenceTable.RelativeError(Poisson.UpperTail(mean, count), Math.Exp(upper)));
    }));

    [Fact]
    public void Masses_add_up_to_the_tail()
    {
        foreach (double mean in new[] { 1e-6, 0.3, 1, 7.5, 40, 1000 })
        {
            double sum = 0;
            for (int count = 0; count < mean + 3; count++)
                sum += Math.Exp(Poisson.LogMass(mean, count));
            Assert.Equal(1, sum / Poisson.LowerTail(mean, (long)Math.Ceiling(mean + 3) - 1), 2e-13);
        }
    }

    [Fact]
    public void The_mass_is_that_of_an_independent_library()
    {
        var random = new Random(71);
        for (int i = 0; i < 5000; i++)
        {
            double mean = Math.Exp(random.NextDouble() * 12 - 6);
            int count = random.Next(0, (int)(3 * mean) + 5);
            double reference = MathNet.Numerics.Distributions.Poisson.PMFLn(mean, count);
            // Its terms are differences of numbers the size of count · ln(count).
            Assert.Equal(reference, Poisson.LogMass(mean, count),
                1e-14 * (10 + (count + mean) * (1 + Math.Log(1 + count + mean))));
        }
    }

    [Fact]
    public void Ends_are_exact()
    {
        Assert.Equal((1, 0), (Poisson.UpperTail(3, 0), Poisson.LogUpperTail(3, -5)));
        Assert.Equal((0, double.NegativeInfinity), (Poisson.LowerTail(3, -1), Poisson.LogLowerTail(3, -1)));
        Assert.Equal((0, 1), (Poisson.UpperTail(0, 1), Poisson.LowerTail(0, 0)));
        Assert.Equal((double.NegativeInfinity, 0), (Poisson.LogUpperTail(0, 1), Poisson.LogLowerTail(0, 0)));
        Assert.Equal((-3, double.NegativeInfinity), (Poisson.LogMass(3, 0), Poisson.LogMass(3, -1)));
        Assert.Equal((0, double.NegativeInfinity), (Poisson.LogMass(0, 0), Poisson.LogMass(0, 1)));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double mean in new[] { double.NaN, -double.Epsilon, 1.01e12, double.PositiveInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Poisson.LogMass(mean, 1));
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Poisson.UpperTail(mean, 1));
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Poisson.LowerTail(mean, 1));
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Poisson.LogUpperTail(mean, 1));
            Assert.Throws<ArgumentOutOfRangeException>("mean", () => Poisson.LogLowerTail(mean, 1));
        }

        foreach (long count in new[] { 1_000_000_000_000, long.MaxValue })
        {
            Assert.Throws<ArgumentOutOfRangeException>("count", () => Poisson.UpperTail(1, count));
            Assert.Throws<ArgumentOutOfRangeException>("count", () => Poisson.LowerTail(1, count));
            Assert.Throws<ArgumentOutOfRangeException>("count", () => Poisson.LogUpperTail(1, count));
            Assert.Throws<ArgumentOutOfRangeException>("count", () => Poisson.LogLowerTail(1, count));
        }
    }
}
