namespace Assize.Bounds.Tests;

public class DivergenceTests
{
    // The documented accuracies.
    const double Accuracy = 2e-15;
    const double InverseAccuracy = 5e-13;

    [Fact]
    public void Divergence_agrees_with_eighty_digits()
    {
        int seen = 0;
        foreach (var row in ReferenceTable.Rows("bernoulli_kl"))
        {
            AssertClose(Divergence.Bernoulli(row.Number("p"), row.Number("q")), row.Number("kl"), row, Accuracy);
            seen++;
        }

        Assert.Equal(232, seen);
    }

    [Fact]
    public void Inverses_agree_with_eighty_digits()
    {
        int upper = 0, lower = 0, mirrored = 0;
        foreach (var row in ReferenceTable.Rows("bernoulli_kl_inverse"))
        {
            var (p, c) = (row.Number("p"), row.Number("c"));
            AssertClose(Divergence.UpperInverse(p, c), row.Number("q_upper"), row);
            upper++;
            if (row.Has("q_lower"))
            {
                AssertClose(Divergence.LowerInverse(p, c), row.Number("q_lower"), row);
                lower++;
            }

            // 1 - p is exact from one half upwards, and only there.
            if (p >= 0.5)
            {
                AssertClose(Divergence.LowerInverse(1 - p, c), row.Number("one_minus_q_upper"), row);
                mirrored++;
            }
        }

        Assert.Equal((168, 154, 70), (upper, lower, mirrored));
    }

    [Fact]
    public void Ends_are_exact()
    {
        Assert.Equal(0, Divergence.Bernoulli(0, 0));
        Assert.Equal(0, Divergence.Bernoulli(1, 1));
        Assert.Equal(0, Divergence.Bernoulli(0.3, 0.3));
        Assert.Equal(double.PositiveInfinity, Divergence.Bernoulli(0.3, 0));
        Assert.Equal(double.PositiveInfinity, Divergence.Bernoulli(0.3, 1));
        Assert.Equal(double.PositiveInfinity, Divergence.Bernoulli(0, 1));
        Assert.Equal(0.3, Divergence.UpperInverse(0.3, 0));
        Assert.Equal(1, Divergence.UpperInverse(1, 5));
        Assert.Equal(0, Divergence.LowerInverse(0, 5));
        Assert.Equal(0, Divergence.LowerInverse(1e-12, 1));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double rate in new[] { -0.1, 1.1, double.NaN })
        {
            Assert.Throws<ArgumentOutOfRangeException>(() => Divergence.Bernoulli(rate, 0.5));
            Assert.Throws<ArgumentOutOfRangeException>(() => Divergence.Bernoulli(0.5, rate));
            Assert.Throws<ArgumentOutOfRangeException>(() => Divergence.UpperInverse(rate, 1));
        }

        foreach (double divergence in new[] { -0.1, double.PositiveInfinity, double.NaN })
            Assert.Throws<ArgumentOutOfRangeException>(() => Divergence.LowerInverse(0.5, divergence));
    }

    static void AssertClose(double computed, double truth, ReferenceTable.Row row, double accuracy = InverseAccuracy) =>
        Assert.True(ReferenceTable.RelativeError(computed, truth) <= accuracy || truth < 1e-300 && computed <= truth * 2,
            $"{row}: {computed:R} against {truth:R}");
}
