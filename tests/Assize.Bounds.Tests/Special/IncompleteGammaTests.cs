namespace Assize.Bounds.Tests;

public class IncompleteGammaTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    [Fact]
    public void Tails_agree_with_sixty_digits() => Assert.Empty(ReferenceTable.Misses(
        "gamma_tail", Accuracy, GammaRows, row =>
    {
        var (shape, point) = (row.Number("shape"), row.Number("x"));
        var (upper, lower) = (row.Number("ln_upper"), row.Number("ln_lower"));
        return Math.Max(
            ReferenceTable.LogError(IncompleteGamma.LogUpperTail(shape, point), upper),
            ReferenceTable.LogError(IncompleteGamma.LogLowerTail(shape, point), lower));
    }));

    [Fact]
    public void Tails_are_the_exponentials_of_their_logarithms() => Assert.Empty(ReferenceTable.Misses(
        "gamma_tail", 1e-12, GammaRows, row =>
    {
        var (shape, point) = (row.Number("shape"), row.Number("x"));
        var (upper, lower) = (row.Number("ln_upper"), row.Number("ln_lower"));
        return Math.Max(
            upper < -690 ? 0 : ReferenceTable.RelativeError(IncompleteGamma.UpperTail(shape, point), Math.Exp(upper)),
            lower < -690 ? 0 : ReferenceTable.RelativeError(IncompleteGamma.LowerTail(shape, point), Math.Exp(lower)));
    }));

    const int GammaRows = 276;

    // MathNet.Numerics 5.0.0 was measured at 1.6e-13 up to shape 100.
    [Fact]
    public void Random_points_agree_with_an_independent_library()
    {
        var random = new Random(74);
        for (int i = 0; i < 10_000; i++)
        {
            double shape = Math.Exp(random.NextDouble() * Math.Log(100));
            double point = shape * Math.Exp(random.NextDouble() * 4 - 2);
            AssertClose(MathNet.Numerics.SpecialFunctions.GammaUpperRegularized(shape, point),
                IncompleteGamma.UpperTail(shape, point), shape, point);
            AssertClose(MathNet.Numerics.SpecialFunctions.GammaLowerRegularized(shape, point),
                IncompleteGamma.LowerTail(shape, point), shape, point);
        }
    }

    static void AssertClose(double reference, double computed, double shape, double point) => Assert.True(
        // Its small complements are 1 minus the other tail.
        Math.Abs(reference - computed) <= 1e-12 * Math.Max(reference, 0.01),
            $"shape {shape:R}, point {point:R}: {computed:R} {reference:R}");

    // Γ(a + 1) recurrence: Q(a + 1, x) - Q(a, x) = x^a e^-x / Γ(a + 1), the Poisson mass for whole a.
    [Fact]
    public void Neighbouring_shapes_differ_by_a_mass()
    {
        foreach (int shape in new[] { 1, 2, 30, 1000 })
        {
            foreach (double share in new[] { 0.8, 0.99, 1.0, 1.04 })
            {
                double point = shape * share;
                double step = IncompleteGamma.UpperTail(shape + 1, point) - IncompleteGamma.UpperTail(shape, point);
                Assert.Equal(Math.Exp(Poisson.LogMass(point, shape)), step, 1e-14);
            }
        }
    }

    [Fact]
    public void Both_sides_of_every_region_meet()
    {
        foreach (double shape in new[] { 1e-10, 0.01, 0.3, 0.5, 0.9999, 1, 7, 1e4, 1e8 })
        {
            foreach (double border in new[] { Math.Exp(-0.7 / shape), 1, shape + Math.Sqrt(shape), 1e60 })
            {
                double below = IncompleteGamma.LogUpperTail(shape, border * (1 - 1e-15));
                double above = IncompleteGamma.LogUpperTail(shape, border * (1 + 1e-15));
                // The points themselves are worth some 1e-15 of the point's own scale, at most.
                double allowed = 1e-12 * (1 + Math.Abs(above)) + 4e-15 * Math.Sqrt(shape);
                Assert.True(Math.Abs(below - above) <= allowed, $"{shape} {border}: {below:R} {above:R}");
            }
        }
    }

    [Fact]
    public void Ends_are_exact()
    {
        foreach (double shape in new[] { 1e-10, 0.5, 1e12 })
        {
            Assert.Equal((1, 0), (IncompleteGamma.UpperTail(shape, 0), IncompleteGamma.LowerTail(shape, 0)));
            Assert.Equal((0, 1), (IncompleteGamma.UpperTail(shape, double.PositiveInfinity),
                IncompleteGamma.LowerTail(shape, double.PositiveInfinity)));
            Assert.Equal((0, double.NegativeInfinity),
                (IncompleteGamma.LogUpperTail(shape, 0), IncompleteGamma.LogLowerTail(shape, 0)));
            Assert.Equal(double.NegativeInfinity, IncompleteGamma.LogUpperTail(shape, double.PositiveInfinity));
            Assert.Equal(0, IncompleteGamma.LogLowerTail(shape, double.PositiveInfinity));
        }
    }

    [Fact]
    public void Hostile_points_give_an_answer_in_the_range()
    {
        foreach (double shape in new[] { 1e-10, 0.3, 1, 50, 1e9 })
        {
            foreach (double point in new[] { double.Epsilon, 1e-300, 1e10, 1e300, double.MaxValue })
            {
                Assert.InRange(IncompleteGamma.UpperTail(shape, point), 0, 1);
                Assert.InRange(IncompleteGamma.LowerTail(shape, point), 0, 1);
                Assert.InRange(IncompleteGamma.LogUpperTail(shape, point), double.NegativeInfinity, 0);
                Assert.InRange(IncompleteGamma.LogLowerTail(shape, point), double.NegativeInfinity, 0);
            }
        }
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double shape in new[] { double.NaN, 0, 9e-11, -1, 1.01e12, double.PositiveInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("shape", () => IncompleteGamma.UpperTail(shape, 1));
            Assert.Throws<ArgumentOutOfRangeException>("shape", () => IncompleteGamma.LowerTail(shape, 1));
            Assert.Throws<ArgumentOutOfRangeException>("shape", () => IncompleteGamma.LogUpperTail(shape, 1));
            Assert.Throws<ArgumentOutOfRangeException>("shape", () => IncompleteGamma.LogLowerTail(shape, 1));
        }

        foreach (double point in new[] { double.NaN, -double.Epsilon })
        {
            Assert.Throws<ArgumentOutOfRangeException>("point", () => IncompleteGamma.UpperTail(1, point));
            Assert.Throws<ArgumentOutOfRangeException>("point", () => IncompleteGamma.LogLowerTail(1, point));
        }
    }
}
