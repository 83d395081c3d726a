using Assize.Bounds;

namespace Assize.Tests.Claims;

/// <summary>The environment belongs to the whole process, so nothing else runs beside these.</summary>
[CollectionDefinition(nameof(SuiteTermsTests), DisableParallelization = true)]
[Collection(nameof(SuiteTermsTests))]
public class SuiteTermsTests
{
    [Fact]
    public void The_environment_sets_what_claims_do_not_say()
    {
        With("ASSIZE_RISK", "1e-6", () => Assert.Equal(1e-6, Claim.Rate(0.5, tolerance: 0.1).Risk));
        With("ASSIZE_CONFIDENCE", "0.95", () => Assert.Equal(0.95, Claim.Rate(0.5, tolerance: 0.1).Confidence));
        With("ASSIZE_RISK", "1e-6", () => Assert.Equal(1e-3, Claim.Rate(0.5, tolerance: 0.1).WithRisk(1e-3).Risk));
        Assert.Equal((UsualTerms.Risk, UsualTerms.Confidence), Claim.Rate(0.5, tolerance: 0.1) is var claim ? (claim.Risk, claim.Confidence) : default);
    }

    [Theory]
    [InlineData("ASSIZE_RISK", "often")]
    [InlineData("ASSIZE_RISK", "0")]
    [InlineData("ASSIZE_RISK", "1")]
    [InlineData("ASSIZE_CONFIDENCE", "NaN")]
    [InlineData("ASSIZE_CONFIDENCE", "0,95")]
    [InlineData("ASSIZE_SEED", "not hex")]
    public void What_it_says_wrongly_is_named(string variable, string value) => With(variable, value, () =>
    {
        string message = Assert.Throws<ClaimRefusedException>(() => Claim.Rate(0.5, tolerance: 0.1).Judge(_ => true)).Message;

        Assert.Contains($"{variable} is '{value}'", message, StringComparison.Ordinal);
        Assert.Contains("Unset it", message, StringComparison.Ordinal);
    });

    static void With(string variable, string value, Action act)
    {
        string? before = Environment.GetEnvironmentVariable(variable);
        Environment.SetEnvironmentVariable(variable, value);
        try
        {
            act();
        }
        finally
        {
            Environment.SetEnvironmentVariable(variable, before);
        }
    }
}
