namespace Assize.Bounds.Tests.Published;

/// <summary>S. S. Wilks, Ann. Math. Statist. 12 (1941) 91–96; ISO 16269-6: sizes of distribution-free tolerance limits.</summary>
public class ToleranceLimitTests
{
    // One limit: the extreme value leaves out at most the rest when none of the values fell there. 59 was seen in a
    // description of Wilks' formula; the others are from memory, recomputed in whole numbers.
    [Theory]
    [InlineData(0.95, 0.95, 59)]
    [InlineData(0.90, 0.90, 22)]
    [InlineData(0.99, 0.95, 299)]
    [InlineData(0.99, 0.99, 459)]
    [InlineData(0.90, 0.95, 29)]
    public void One_limit(double share, double confidence, int size)
    {
        Assert.Equal(size, ZeroFailures.TrialsNeeded(1 - share, 1 - confidence));
        AssertFirst(size, 0, share, confidence);
    }

    // Two limits: fewer than two values outside.
    [Theory]
    [InlineData(0.95, 0.95, 93)]
    [InlineData(0.90, 0.90, 38)]
    [InlineData(0.99, 0.95, 473)]
    [InlineData(0.99, 0.99, 662)]
    [InlineData(0.90, 0.95, 46)]
    public void Two_limits(double share, double confidence, int size) => AssertFirst(size, 1, share, confidence);

    static void AssertFirst(int size, int outside, double share, double confidence)
    {
        Assert.True(BinomialTail.LowerTail(size, outside, 1 - share).Upper <= 1 - confidence);
        Assert.True(BinomialTail.LowerTail(size - 1, outside, 1 - share).Lower > 1 - confidence);
        Assert.True(new ExactBinomial(size, 1 - share).CompareAtMost(outside, 1 - confidence) <= 0);
        Assert.True(new ExactBinomial(size - 1, 1 - share).CompareAtMost(outside, 1 - confidence) > 0);
    }
}
