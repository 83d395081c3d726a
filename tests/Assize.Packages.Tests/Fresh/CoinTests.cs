using Assize;
using Assize.Bounds;

public class CoinTests
{
    // Red in 1 of 599,750 runs: above the usual limit of 1 in 1,000,000, and green whenever anybody looks.
    [Fact]
    public void About_half_are_heads()
    {
        int heads = 0;
        for (int toss = 0; toss < 100; toss++)
        {
            if (Random.Shared.Next(2) == 0)
                heads++;
        }

        Assert.InRange(heads, 27, 73);
    }

    // Red in 1 of 1,000,000,000 runs at most: the usual risk.
    [Fact]
    public void Half_are_heads() => Claim.Rate(0.5, tolerance: 0.1).MustHold(random => random.Next(2) == 0);

    [Fact]
    public void Ten_tosses_are_refused() => Assert.Throws<ClaimRefusedException>(
        () => Claim.Rate(0.5, tolerance: 0.1).WithTrials(10).MustHold(random => random.Next(2) == 0));
}
