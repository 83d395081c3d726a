using Microsoft.CodeAnalysis.CodeFixes;

namespace Assize.Analyzers.Tests;

public class RaiseTrialsFixTests
{
    const string Loop = """
        var picker = new Picker();
        {0}
        int ripe = 0;
        for (int i = 0; i < n; i++)
            if (picker.IsRipe()) ripe++;
        Assert.InRange((double)ripe / n, 0.4, 0.6);
        """;

    static readonly long Needed = Verify.Reading(With("const int n = 100;")).TrialsNeeded(1e-6)!.Value;

    [Theory]
    [InlineData("const int n = /* how many */ 100; // pickings", "const int n = /* how many */ {0}; // pickings")]
    [InlineData("int n = 1_0_0;", "int n = {0};")]
    [InlineData("var n = 100L;", "var n = {0}L;")]
    public Task Raises_the_one_constant_and_keeps_what_is_around_it(string before, string after) =>
        Verify.Fix("ASZ2001", With(before),
            With(string.Format(System.Globalization.CultureInfo.InvariantCulture, after, Needed)));

    [Fact]
    public Task Raises_the_trials_of_a_claim()
    {
        long needed = Claim.Rate(0.5, tolerance: 0.1).Plan().FixedTrials;
        return Verify.Fix(
            "ASZ1001",
            "_ = Claim.Rate(0.5, tolerance: 0.1).WithTrials(/*few*/ 100);",
            $"_ = Claim.Rate(0.5, tolerance: 0.1).WithTrials(/*few*/ {needed});");
    }

    [Theory]
    [InlineData("int n = 100; n = n * 2;")]        // not one literal
    [InlineData("int n = Trees + 1;")]
    public Task Is_not_offered_without_one_literal(string declaration) => Verify.NoFix("ASZ2001", With(declaration));

    [Theory]
    [InlineData("ripe / 100.0, 0.4, 0.6")]         // the normaliser would stay behind
    [InlineData("ripe, 40, 60")]                   // the band would
    public Task Is_not_offered_where_another_number_would_have_to_move(string asserted) => Verify.NoFix(
        "ASZ2001",
        $"var picker = new Picker(); int ripe = 0; for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++; Assert.InRange({asserted});");

    [Fact]
    public Task Is_not_offered_where_the_band_is_made_of_standard_errors() => Verify.NoFix(
        "ASZ2001",
        With("const int n = 100;").Replace(
            "0.4, 0.6", "0.5 - 2 * Math.Sqrt(.25 / n), 0.5 + 2 * Math.Sqrt(.25 / n)", StringComparison.Ordinal));

    [Theory]
    [InlineData(FixAllScope.Document, 3)]
    [InlineData(FixAllScope.Project, 2)]
    [InlineData(FixAllScope.Solution, 0)]
    public async Task Fixes_all_in_a_scope(FixAllScope scope, int left) =>
        Assert.Equal(left, await Verify.Left("ASZ2001", With("const int n = 100;"), scope));

    static string With(string declaration) => Loop.Replace("{0}", declaration, StringComparison.Ordinal);
}
