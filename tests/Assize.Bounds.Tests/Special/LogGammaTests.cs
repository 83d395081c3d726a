namespace Assize.Bounds.Tests;

public class LogGammaTests
{
    // The documented accuracies.
    const double Accuracy = 5e-13;
    const double StirlingAccuracy = 1e-13;

    [Fact]
    public void It_agrees_with_sixty_digits() => Assert.Empty(ReferenceTable.Misses("log_gamma", Accuracy, 46, row =>
        ReferenceTable.RelativeError(LogGamma.Of(row.Number("x")), row.Number("ln_gamma"))));

    [Fact]
    public void The_remainder_of_Stirlings_formula_agrees_with_sixty_digits() =>
        Assert.Empty(ReferenceTable.Misses("log_gamma", StirlingAccuracy, 46, row => row.Number("x") < 0.01
            ? 0
            : ReferenceTable.RelativeError(StirlingError.Of(row.Number("x")), row.Number("stirling_error"))));

    [Fact]
    public void Random_points_away_from_the_zeros_agree_with_an_independent_library()
    {
        var random = new Random(75);
        for (int i = 0; i < 10_000; i++)
        {
            double value = Math.Exp(random.NextDouble() * 40 - 20);
            double reference = MathNet.Numerics.SpecialFunctions.GammaLn(value);
            if (Math.Abs(value - 1) > 0.2 && Math.Abs(value - 2) > 0.2)
                Assert.True(ReferenceTable.RelativeError(LogGamma.Of(value), reference) < Accuracy, $"{value:R}");
        }
    }

    // Σ 1/(n + 1)^k over n ≥ 1 is the entry for k; the 30th, for k = 31, by its first terms.
    [Fact]
    public void An_entry_of_the_table_of_zeta_is_recomputed_through_the_slope_of_the_function()
    {
        // Euler's constant: -ψ(1), the slope at 1.
        Assert.Equal(0.57721566490153286, -LogGamma.OfOnePlus(1e-9) / 1e-9, 2e-9);
        Assert.Equal(Math.PI * Math.PI / 6, (LogGamma.OfOnePlus(1e-4) + LogGamma.OfOnePlus(-1e-4)) / 1e-8, 1e-7);
    }

    [Fact]
    public void Zeros_are_exact_and_known_values_hold()
    {
        Assert.Equal((0, 0), (LogGamma.Of(1), LogGamma.Of(2)));
        // Γ(½) = √π; 20! = 2432902008176640000.
        Assert.Equal(0.5 * Math.Log(Math.PI), LogGamma.Of(0.5), 1e-15);
        Assert.Equal(Math.Log(2432902008176640000), LogGamma.Of(21), 1e-13);
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double value in new[] { double.NaN, 0, -1, 1.01e300, double.PositiveInfinity })
            Assert.Throws<ArgumentOutOfRangeException>("value", () => LogGamma.Of(value));
    }
}
