namespace Assize.Bounds.Tests.Published;

/// <summary>R. A. Fisher, The Design of Experiments (1935), chapter 2: eight cups, four of them with the milk first.</summary>
public class TastingTests
{
    // Three or four right by luck: 16 + 1 of the 70 ways to choose four cups; all four: 1 of 70.
    [Fact]
    public void The_lady_tasting_tea()
    {
        Assert.Equal(17 / 70.0, Math.Exp(Hypergeometric.LogUpperTail(8, 4, 4, 3)), 1e-15);
        Assert.Equal(1 / 70.0, Math.Exp(Hypergeometric.LogUpperTail(8, 4, 4, 4)), 1e-16);
        // Two samples of four values apart entirely, to one side.
        Assert.Equal(1 / 70.0, TwoSampleTail.OneSided(4, 4, 1).Upper, 1e-12);
    }
}
