namespace Assize.Bounds.Tests;

public class GammaQuantileTests
{
    [Fact]
    public void The_points_enclose_the_probability_closely()
    {
        int seen = 0;
        foreach (double shape in new[] { 0.5, 0.77, 1, 3, 200, 1e5, 1e9 })
        {
            foreach (double probability in new[] { 1e-140, 1e-30, 1e-6, 0.1, 0.5 })
            {
                var upper = GammaQuantile.AroundUpper(shape, probability);
                double logarithm = Math.Log(probability);
                Assert.True(IncompleteGamma.LogUpperTail(shape, upper.Lower) >= logarithm);
                Assert.True(IncompleteGamma.LogUpperTail(shape, upper.Upper) <= logarithm);
                var lower = GammaQuantile.AroundLower(shape, probability);
                Assert.True(IncompleteGamma.LogLowerTail(shape, lower.Lower) <= logarithm);
                Assert.True(IncompleteGamma.LogLowerTail(shape, lower.Upper) >= logarithm);
                Assert.Equal((1, 1), (upper.Upper / upper.Lower, lower.Upper / lower.Lower), (a, b) =>
                    Math.Abs(a.Item1 - b.Item1) < 3e-13 && Math.Abs(a.Item2 - b.Item2) < 3e-13);
                seen++;
            }
        }

        Assert.Equal(35, seen);
    }
}
