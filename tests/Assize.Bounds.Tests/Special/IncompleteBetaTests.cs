namespace Assize.Bounds.Tests;

public class IncompleteBetaTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    static double LogLower(double a, double b, double x) =>
        IncompleteBeta.LogLower(a, b, x, 1 - x, b * x - a * (1 - x));

    // I_x(k, n - k + 1) = P(S ≥ k): the table of binomial tails holds 80-digit values of it.
    [Fact]
    public void Whole_parameters_give_binomial_tails()
    {
        int seen = 0;
        Assert.Empty(ReferenceTable.Misses("binomial_tail", Accuracy, 625, row =>
        {
            var (n, k, p) = (row.Whole("n"), row.Whole("k"), row.Number("p"));
            // The excess is a difference: only where it is formed without loss does the table speak for the function.
            double a = k, b = n - k + 1, excess = -BinomialPoint.MeanExcess(n, k, p);
            if (k == 0 || p >= 1 || -excess + p > 0)
                return 0;

            seen++;
            return ReferenceTable.LogError(IncompleteBeta.LogLower(a, b, p, 1 - p, -excess + p), row.Number("ln_p_ge"));
        }));
        Assert.True(seen > 200, $"only {seen} rows");
    }

    // I_x(½, ½) = 2/π arcsin √x; I_x(a, 1) = x^a.
    [Fact]
    public void Halves_and_ones_have_formulas()
    {
        for (double x = 1e-12; x < 0.5; x *= 1.7)
        {
            double arcsine = 2 / Math.PI * Math.Asin(Math.Sqrt(x));
            Assert.True(ReferenceTable.RelativeError(Math.Exp(LogLower(0.5, 0.5, x)), arcsine) < Accuracy, $"{x:R}");
            Assert.True(ReferenceTable.LogError(LogLower(7.5, 1, x), 7.5 * Math.Log(x)) < Accuracy, $"{x:R}");
        }
    }

    // MathNet.Numerics 5.0.0 was measured at 2e-13 up to parameters of 1,000.
    [Fact]
    public void Random_points_agree_with_an_independent_library()
    {
        var random = new Random(82);
        int seen = 0;
        for (int i = 0; i < 10_000; i++)
        {
            double a = 0.5 + 300 * Math.Pow(random.NextDouble(), 3), b = 0.5 + 300 * Math.Pow(random.NextDouble(), 3);
            double x = a / (a + b) * random.NextDouble();
            double reference = MathNet.Numerics.SpecialFunctions.BetaRegularized(a, b, x);
            if (reference < 1e-290)
                continue;

            Assert.True(ReferenceTable.RelativeError(Math.Exp(LogLower(a, b, x)), reference) < 4e-12,
                $"{a:R} {b:R} {x:R}");
            seen++;
        }

        Assert.True(seen > 9000, $"only {seen} points");
    }
}
