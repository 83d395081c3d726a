namespace Assize.Bounds.Tests;

public class ZeroFailuresTests
{
    // Common practice: 59 items without a failure show 95 % reliability at 95 % confidence, 299 show 99 %, 22 show 90
    // % at 90 %.
    [Theory]
    [InlineData(0.05, 0.05, 59)]
    [InlineData(0.01, 0.05, 299)]
    [InlineData(0.1, 0.1, 22)]
    [InlineData(0.001, 0.001, 6905)]
    [InlineData(0.5, 0.25, 2)]
    [InlineData(1, 0.001, 1)]
    public void Known_demonstrations_are_reproduced(double defect, double miss, long trials)
    {
        // A probability exactly on its limit counts as above it: the last digit of a double cannot tell.
        long tie = Math.Pow(1 - defect, trials) == miss ? 1 : 0;

        Assert.Equal(trials + tie, ZeroFailures.TrialsNeeded(defect, miss));
    }

    [Fact]
    public void The_number_is_the_first_that_suffices()
    {
        int seen = 0;
        foreach (double defect in new[] { 0.3, 0.03, 0.011 })
        {
            foreach (double miss in new[] { 0.3, 0.01, 1e-6 })
            {
                int trials = (int)ZeroFailures.TrialsNeeded(defect, miss);
                Assert.True(new ExactBinomial(trials, defect).CompareAtMost(0, miss) <= 0);
                Assert.True(new ExactBinomial(trials - 1, defect).CompareAtMost(0, miss) > 0);
                seen++;
            }
        }

        Assert.Equal(9, seen);
    }

    [Fact]
    public void It_applies_to_a_target_at_the_end_with_no_tolerance()
    {
        Assert.True(ZeroFailures.Applies(Edges.AtMost(Domain.Rate, 0, 0.1)));
        Assert.True(ZeroFailures.Applies(Edges.AtLeast(Domain.Rate, 1, 0.1)));
        Assert.True(ZeroFailures.Applies(Edges.Around(Domain.Rate, 0, 0, 0.1)));
        Assert.True(ZeroFailures.Applies(Edges.Around(Domain.Rate, 1, 0, 0.1)));
        Assert.False(ZeroFailures.Applies(Edges.AtMost(Domain.Rate, 0.01, 0.1)));
        Assert.False(ZeroFailures.Applies(Edges.Around(Domain.Rate, 0, 0.01, 0.1)));
        Assert.Throws<ArgumentNullException>(() => ZeroFailures.Applies(null!));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => ZeroFailures.TrialsNeeded(0, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => ZeroFailures.TrialsNeeded(1.1, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => ZeroFailures.TrialsNeeded(double.NaN, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => ZeroFailures.TrialsNeeded(0.1, 0));
        Assert.Throws<ArgumentOutOfRangeException>(() => ZeroFailures.TrialsNeeded(0.1, 1));
        Assert.Throws<ClaimRefusedException>(() => ZeroFailures.TrialsNeeded(1e-16, 0.1));
    }
}
