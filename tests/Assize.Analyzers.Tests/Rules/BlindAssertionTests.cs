namespace Assize.Analyzers.Tests;

public class BlindAssertionTests
{
    const string Loop = "var picker = {0}; int ripe = 0; for (int i = 0; i < {1}; i++) if (picker.IsRipe()) ripe++; Assert.InRange(ripe / {1}.0, {2});";

    static string Test(string trials, string band, string picker = "new Picker()") => Loop
        .Replace("{0}", picker, StringComparison.Ordinal)
        .Replace("{1}", trials, StringComparison.Ordinal)
        .Replace("{2}", band, StringComparison.Ordinal);

    [Fact]
    public async Task A_band_that_every_count_passes_cannot_fail() =>
        Assert.StartsWith("Cannot fail: every count passes", await Verify.Message("ASZ2003", Test("10", "-0.1, 1.1")), StringComparison.Ordinal);

    // Hoeffding 1963: 100,000 trials afford at most sqrt(ln(2e6) / 200,000) = 0.00852 at 1 in 1,000,000; 0.3 is 35 times that.
    [Fact]
    public async Task A_band_far_wider_than_its_trials_afford_is_told_by_how_much()
    {
        string message = await Verify.Message("ASZ2003", Test("100000", "0.2, 0.8"));

        var times = System.Text.RegularExpressions.Regex.Match(message, @"the band is ([\d.]+) times");
        Assert.True(times.Success, message);
        Assert.True(double.Parse(times.Groups[1].Value, System.Globalization.CultureInfo.InvariantCulture) >= 35, message);
    }

    [Theory]
    [InlineData("10000", "0.45, 0.55")]
    [InlineData("400", "0.4, 0.6")]
    public Task A_band_its_trials_can_hold_is_not_blind(string trials, string band) => Verify.Rule("ASZ2003", Test(trials, band));
}
