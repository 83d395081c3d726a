namespace Assize.Bounds.Tests;

public class PoissonLimitsTests
{
    // The documented accuracy.
    const double Accuracy = 2e-12;

    [Fact]
    public void Limits_lead_back_to_the_means_of_the_table()
    {
        int seen = 0;
        Assert.Empty(ReferenceTable.Misses("poisson_tail", Accuracy, 164, row =>
        {
            var (mean, count) = (row.Number("lambda"), row.Whole("k"));
            var (below, above) = (Math.Exp(row.Number("ln_p_le")), Math.Exp(row.Number("ln_p_ge")));
            double error = 0;
            if (count <= 1e9 && below is >= 1e-140 and <= 0.5 && ++seen > 0)
                error = ReferenceTable.RelativeError(PoissonLimits.Upper(count, below), mean);
            if (count is > 0 and <= 1_000_000_000 && above is >= 1e-140 and <= 0.5 && ++seen > 0)
                error = Math.Max(error, ReferenceTable.RelativeError(PoissonLimits.Lower(count, above), mean));
            return error;
        }));
        Assert.True(seen > 100, $"only {seen} limits");
    }

    // F. Garwood, Biometrika 28 (1936) 437–442; these 95 % limits are printed in most handbooks since.
    [Theory]
    [InlineData(0, 0, 3.689)]
    [InlineData(1, 0.0253, 5.572)]
    [InlineData(5, 1.623, 11.668)]
    [InlineData(10, 4.795, 18.390)]
    public void Limits_agree_with_the_printed_ones(long count, double lower, double upper)
    {
        Assert.Equal(lower, PoissonLimits.Lower(count, 0.025), 5e-4);
        Assert.Equal(upper, PoissonLimits.Upper(count, 0.025), 6e-4);
    }

    // P(N = 0) = e^-mean, and P(N ≥ 1) = 1 - e^-mean.
    [Theory]
    [InlineData(0.5)]
    [InlineData(0.001)]
    [InlineData(1e-140)]
    public void Limits_of_the_least_counts_have_formulas_and_lie_outside_them(double risk)
    {
        var (upper, lower) = (-Elementary.Log(risk), -Elementary.LogOnePlus(-risk));
        Assert.InRange(PoissonLimits.Upper(0, risk), upper, upper * (1 + Accuracy));
        Assert.InRange(PoissonLimits.Lower(1, risk), lower * (1 - Accuracy), lower);
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (long count in new[] { -1, 1_000_000_001, long.MaxValue })
        {
            Assert.Throws<ArgumentOutOfRangeException>("count", () => PoissonLimits.Lower(count, 0.1));
            Assert.Throws<ArgumentOutOfRangeException>("count", () => PoissonLimits.Upper(count, 0.1));
        }

        foreach (double risk in new[] { double.NaN, 0, 1e-141, 0.51, -1 })
        {
            Assert.Throws<ArgumentOutOfRangeException>("risk", () => PoissonLimits.Lower(1, risk));
            Assert.Throws<ArgumentOutOfRangeException>("risk", () => PoissonLimits.Upper(1, risk));
        }
    }
}
