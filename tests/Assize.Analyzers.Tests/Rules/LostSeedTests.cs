namespace Assize.Analyzers.Tests;

public class LostSeedTests
{
    [Theory]
    [InlineData("Random.Shared", "the generator shared by the process")]
    [InlineData("rng", "a generator made without a seed")]
    public async Task The_generator_is_named(string generator, string source) => Assert.Contains(
        source,
        await Verify.Message("ASZ2005",
            $"var rng = new Random(); int n = 0; for (int i = 0; i < 9999; i++) if ({generator}.Next(2) == 0) n++; Assert.InRange(n, 4500, 5500);"),
        StringComparison.Ordinal);
}
