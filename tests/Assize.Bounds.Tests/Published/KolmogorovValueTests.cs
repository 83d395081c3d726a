namespace Assize.Bounds.Tests.Published;

/// <summary>G. Marsaglia, W. W. Tsang and J. Wang, Evaluating Kolmogorov's distribution, J. Stat. Softw. 8 (2003), 18, and
/// the classic table of critical distances.</summary>
public class KolmogorovValueTests
{
    // The first is printed in the paper's example; all were recomputed elsewhere with its matrix method in 40 digits.
    [Theory]
    [InlineData(10, 0.274, 0.628479615456504275)]
    [InlineData(100, 0.1, 0.747307242993609873)]
    [InlineData(5, 0.3, 0.336)]
    [InlineData(2000, 0.04, 0.996769431917137)]
    [InlineData(2000, 0.06, 0.999998939569306)]
    public void Distribution(int trials, double distance, double stays)
    {
        var tail = KolmogorovTail.TwoSided(trials, distance);

        Assert.Equal(1 - stays, (tail.Lower + tail.Upper) / 2, 2e-12);
        Assert.InRange(1 - stays, tail.Lower - 1e-15, tail.Upper + 1e-15);
    }

    // Critical distances for 5 % and 1 % (from memory), to five digits.
    [Theory]
    [InlineData(5, 0.56328, 0.66853)]
    [InlineData(10, 0.40925, 0.48893)]
    [InlineData(20, 0.29408, 0.35241)]
    [InlineData(30, 0.24170, 0.28986)]
    public void Critical_distances(int trials, double five, double one)
    {
        foreach (var (distance, risk) in new[] { (five, 0.05), (one, 0.01) })
        {
            Assert.True(KolmogorovTail.TwoSided(trials, distance - 1e-5).Lower > risk);
            Assert.True(KolmogorovTail.TwoSided(trials, distance + 1e-5).Upper < risk);
            Assert.InRange(Massart.EitherRadius(trials, risk), distance, 1.09 * distance);
        }
    }
}
