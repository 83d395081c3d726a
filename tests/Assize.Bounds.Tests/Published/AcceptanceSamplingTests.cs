namespace Assize.Bounds.Tests.Published;

/// <summary>MIL-STD-105E (1989) and ISO 2859-1: single sampling plans for code letters J and K.</summary>
public class AcceptanceSamplingTests
{
    // Sizes 80 and 125 and the acceptance numbers were seen in table II-A; the qualities of tables X-J (binomial) and X-K
    // (Poisson), in per cent, are from memory and may be a unit off in the last digit.
    [Theory]
    [InlineData(0, 0.0641, 2.84)]
    [InlineData(1, 0.446, 4.78)]
    [InlineData(2, 1.03, 6.52)]
    [InlineData(3, 1.73, 8.16)]
    [InlineData(5, 3.32, 11.3)]
    [InlineData(7, 5.06, 14.2)]
    [InlineData(10, 7.91, 18.6)]
    [InlineData(14, 11.9, 24.2)]
    public void Letter_J(int acceptance, double usuallyAccepted, double seldomAccepted)
    {
        AssertPrinted(usuallyAccepted, 100 * BinomialLimits.Lower(80, acceptance + 1, 0.05));
        AssertPrinted(seldomAccepted, 100 * BinomialLimits.Upper(80, acceptance, 0.1));
        double quality = BinomialLimits.Lower(80, acceptance + 1, 0.05);
        Assert.Equal(0.95, BinomialTail.LowerTail(80, acceptance, quality).Upper, 1e-11);
    }

    [Theory]
    [InlineData(0, 0.0410, 1.84)]
    [InlineData(1, 0.284, 3.11)]
    [InlineData(2, 0.654, 4.26)]
    [InlineData(3, 1.09, 5.35)]
    [InlineData(5, 2.09, 7.42)]
    [InlineData(7, 3.19, 9.42)]
    [InlineData(10, 4.94, 12.3)]
    [InlineData(14, 7.40, 16.1)]
    [InlineData(21, 11.9, 22.5)]
    public void Letter_K(int acceptance, double usuallyAccepted, double seldomAccepted)
    {
        AssertPrinted(usuallyAccepted, 100 * PoissonLimits.Lower(acceptance + 1, 0.05) / 125);
        AssertPrinted(seldomAccepted, 100 * PoissonLimits.Upper(acceptance, 0.1) / 125);
        // By the exact law of 125 items good lots may be a little worse, none being found excepted, and bad ones better.
        double good = BinomialLimits.Lower(125, acceptance + 1, 0.05);
        Assert.True(acceptance == 0 || good > PoissonLimits.Lower(acceptance + 1, 0.05) / 125);
        Assert.True(BinomialLimits.Upper(125, acceptance, 0.1) < PoissonLimits.Upper(acceptance, 0.1) / 125);
    }

    // Three digits are printed.
    static void AssertPrinted(double printed, double computed) =>
        Assert.Equal(printed, computed, 1.5 * Math.Pow(10, Math.Floor(Math.Log10(printed)) - 2));

    // SAS/QC 15.1 User's Guide, Evaluating Single-Sampling Plans (seen): 20 items, at most one nonconforming. From a lot
    // of 120 with 22 nonconforming 0.0762970752; from lots with 18 % nonconforming 0.1018322793.
    [Fact]
    public void Chances_of_acceptance_from_one_lot_and_from_many()
    {
        Assert.Equal(0.0762970752, Math.Exp(Hypergeometric.LogLowerTail(120, 22, 20, 1)), 5e-11);
        Assert.Equal(0.1018322793, BinomialTail.LowerTail(20, 1, 0.18).Lower, 5e-11);
    }
}
