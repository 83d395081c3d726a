namespace Assize.Analyzers.Tests;

public class PinnedSeedTests
{
    const string Loop = "var picker = {0}; int ripe = 0; for (int i = 0; i < {1}; i++) if (picker.IsRipe()) ripe++; Assert.InRange(ripe / {1}.0, {2});";

    static string Test(string trials, string band, string picker = "new Picker()") => Loop
        .Replace("{0}", picker, StringComparison.Ordinal)
        .Replace("{1}", trials, StringComparison.Ordinal)
        .Replace("{2}", band, StringComparison.Ordinal);

    // 40…60 of 100 at a half are missed with probability 0.0352002: exact binomial tails, as in the miniatures' table.
    [Fact]
    public async Task The_share_of_red_seeds_is_named() => Assert.StartsWith(
        "On healthy code at least 3.5 of 100 seeds are red",
        await Verify.Message("ASZ2004", Test("100", "0.4, 0.6", "new Picker(0.5, new Random(7))")), StringComparison.Ordinal);

    [Theory]
    [InlineData("var seeded = new Random(7); var picker = new Picker(0.5, seeded);")]
    [InlineData("var picker = Picker.Seeded(7);")]
    public Task A_fixed_seed_is_not_flaky(string made) => Verify.Rule(
        "ASZ2001", Test("100", "0.4, 0.6").Replace("var picker = new Picker();", made, StringComparison.Ordinal));
}
